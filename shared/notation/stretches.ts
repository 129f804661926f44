import { ticksOf } from '#shared/notation/note-values';
import type { NotatedStudy } from '#shared/notation/system-plan';
import type { Chord } from '#shared/study/study.document';

/** A stretch of one chord, or of rest, within one bar. */
export interface Stretch {
  readonly chord: Chord | null;
  readonly place: number;
  readonly bar: number;
  readonly from: number;
  readonly ticks: number;
  readonly first: boolean;
  readonly final: boolean;
}

/**
 * Divides a progression at its bar lines. Ends are rounded, not lengths, so that lengths which no note can write do
 * not add up to a drift.
 * @param chords in their order
 * @param metre of the study
 * @returns stretches in their order, the last bar filled up with rest
 * @example stretchesOf([a chord of 6 beats], { beats: 4, unit: 4 }).length // 3: a bar, half a bar, half a bar's rest
 */
export function stretchesOf(
  chords: readonly Chord[],
  { beats, unit }: NotatedStudy['metre'],
): readonly Stretch[] {
  const barTicks = ticksOf(beats, unit);
  const stretches: Stretch[] = [];
  let exact = 0;
  let at = 0;
  const add = (chord: Chord | null, place: number, end: number): void => {
    const start = at;
    while (at < end) {
      const bar = Math.floor(at / barTicks);
      const ticks = Math.min(end, (bar + 1) * barTicks) - at;
      const [first, final] = [at === start, at + ticks === end];
      stretches.push({ chord, place, bar, from: at - bar * barTicks, ticks, first, final });
      at += ticks;
    }
  };
  chords.forEach((chord, index) => {
    exact += ticksOf(chord.beats, unit);
    add(chord, index, Math.max(Math.round(exact), at + 1));
  });
  add(null, chords.length, Math.ceil(at / barTicks) * barTicks);
  return stretches;
}
