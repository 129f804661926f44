import { ref, shallowRef, type Ref } from 'vue';
import { equalLoudness } from '@/audio/equal-loudness';
import { loudestLevel } from '@/audio/levels';
import type { Side, SoundEngine } from '@/audio/sound-engine';
import type { VoiceSound } from '#shared/voicing/analysis';

interface Compared {
  readonly a: readonly VoiceSound[];
  readonly b: readonly VoiceSound[];
}

/** Two chords that sound in turn, equally loud. */
interface PlaybackComparison {
  /** Which of the two is heard. */
  readonly side: Ref<Side>;
  bring(a: readonly VoiceSound[], b: readonly VoiceSound[]): void;
  /** Gives both to the engine, as they are to sound. */
  give(to: SoundEngine, lifted: (sounds: readonly VoiceSound[]) => readonly VoiceSound[]): Promise<void>;
}

/** Keeps what is compared, so that it can be heard again, and which of the two is heard. */
export function usePlaybackComparison(): PlaybackComparison {
  const side = ref<Side>('a');
  const compared = shallowRef<Compared>({ a: [], b: [] });
  return {
    side,
    bring: (a, b) => void (compared.value = { a, b }),
    give(to, lifted) {
      const [a, b] = [lifted(compared.value.a), lifted(compared.value.b)];
      const trims = equalLoudness(a, b);
      const chords = { a: { sounds: a, trim: trims.a }, b: { sounds: b, trim: trims.b } };
      return to.compare(chords, side.value, loudestLevel([a, b]));
    },
  };
}
