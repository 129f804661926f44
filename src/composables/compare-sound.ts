import { computed, watch } from 'vue';
import type { Side } from '#shared/voicing/blind-rounds';
import type { VoiceSound } from '#shared/voicing/analysis';
import { usePlayback } from '@/composables/playback';
import type { Playback } from '@/composables/playback-interface';

/** What is compared, as it sounds. */
export type ComparedSounds = Readonly<Record<Side, readonly VoiceSound[]>>;

const LETTERS = { held: 'a', now: 'b' } as const;

/**
 * Sounds one of two voicings, or the other, at equal loudness; while they sound they follow every change.
 * @param sounds of both; nothing while nothing is compared
 */
export function useCompareSound(
  sounds: () => ComparedSounds | null,
  playback: Pick<Playback, 'mode' | 'side' | 'compareAB' | 'switchTo' | 'stop'> = usePlayback(),
) {
  const { mode, side } = playback;
  const heard = computed<Side | null>(() => {
    if (mode.value !== 'compare') return null;
    return side.value === LETTERS.held ? 'held' : 'now';
  });

  async function sound(wanted: Side): Promise<void> {
    const compared = sounds();
    if (!compared) return;
    playback.switchTo(LETTERS[wanted]);
    if (mode.value !== 'compare') await playback.compareAB(compared.held, compared.now);
  }

  function quiet(): void {
    if (heard.value !== null) playback.stop();
  }

  /** Lets one be heard; once more, and it ends. */
  function hear(wanted: Side): void {
    if (heard.value === wanted) quiet();
    else void sound(wanted);
  }

  /** The other of the two; from silence the one that is held. */
  function switchOver(): void {
    void sound(heard.value === 'held' ? 'now' : 'held');
  }

  watch(sounds, (compared) => {
    if (heard.value === null) return;
    if (compared) void playback.compareAB(compared.held, compared.now);
    else quiet();
  });
  return { heard, hear, switchOver, quiet };
}
