import { useTimeoutFn } from '@vueuse/core';
import { sameListening, WHOLE_CHORD, type Listening } from '@/audio/listening';
import {
  partialsSchedule,
  progressionSchedule,
  type ProgressionChord,
  type TimedSound,
} from '@/audio/schedule';
import type { usePlaybackChoice } from '@/composables/playback-choice';
import type { usePlaybackComparison } from '@/composables/playback-comparison';
import type { useLazyEngine } from '@/composables/playback-engine';
import type { PlaybackMode, usePlaybackSigns } from '@/composables/playback-signs';
import type { Decibels } from '#shared/units';

/** A part is heard for so long: time to listen into it, and it need not be ended by hand. Chosen. */
export const HEAR_SECONDS = 4;
const MILLISECONDS = 1000;

interface PlaybackParts {
  readonly choice: ReturnType<typeof usePlaybackChoice>;
  readonly lazy: ReturnType<typeof useLazyEngine>;
  readonly signs: ReturnType<typeof usePlaybackSigns>;
  readonly comparison: ReturnType<typeof usePlaybackComparison>;
}

/** What can be asked of playback, each order taking the place of the one before it. */
export function usePlaybackOrders({ choice, lazy, signs, comparison }: PlaybackParts) {
  const { material, listening, heard, loudest, lifted } = choice;
  const { engine, order, withdraw } = lazy;
  const { mode, show } = signs;
  const hearing = useTimeoutFn(() => end('stop'), HEAR_SECONDS * MILLISECONDS, { immediate: false });

  let tempoBpm = material.value.tempoBpm;

  async function sustain(part: Listening, as: 'hold' | 'listen'): Promise<void> {
    hearing.stop();
    listening.value = part;
    if (!(await order((to) => to.hold(heard.value, loudest())))) return;
    show(as);
    if (as === 'listen') hearing.start();
  }

  async function play(
    begun: PlaybackMode,
    schedule: readonly TimedSound[],
    scale: Decibels = loudest(),
  ): Promise<void> {
    hearing.stop();
    listening.value = WHOLE_CHORD;
    if (await order((to) => to.play(schedule, scale))) show(begun);
  }

  /** A tempo is kept to the end, so that changing it makes nobody lose the beat. */
  async function playProgression(): Promise<void> {
    tempoBpm = material.value.tempoBpm;
    await play('progression', progressionSchedule(choice.progression.value, tempoBpm));
  }

  async function playPartials(voiceId: string): Promise<void> {
    const sound = lifted(material.value.sounds).find(({ id }) => id === voiceId);
    if (sound) await play('partials', partialsSchedule(sound));
  }

  async function compare(): Promise<void> {
    hearing.stop();
    listening.value = WHOLE_CHORD;
    if (await order((to) => comparison.give(to, lifted))) show('compare');
  }

  function end(how: 'stop' | 'silence'): void {
    hearing.stop();
    withdraw();
    engine.value?.[how]();
    listening.value = WHOLE_CHORD;
    show('silent');
  }

  async function hear(part: Listening): Promise<void> {
    if (mode.value === 'listen' && sameListening(part, listening.value)) end('stop');
    else await sustain(part, 'listen');
  }

  /** What is held follows what there is to hear; how long it is heard does not change. */
  function follow(): void {
    if (mode.value === 'hold' || mode.value === 'listen') void order((to) => to.hold(heard.value, loudest()));
    if (mode.value === 'compare') void compare();
  }

  function revise(progression: readonly ProgressionChord[]): void {
    if (mode.value !== 'progression') return;
    engine.value?.revise(progressionSchedule(progression, tempoBpm), loudest());
  }

  return { sustain, play, playProgression, playPartials, compare, hear, end, follow, revise };
}
