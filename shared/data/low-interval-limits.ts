import type { Midi, Semitones } from '#shared/units';

/** One line of the chart of low interval limits. */
export interface LowIntervalLimit {
  /** The chart's name of the interval. */
  readonly interval: string;
  readonly semitones: Semitones;
  /** The lowest lower note that the chart allows, spelt as printed. */
  readonly lowest: string;
  readonly lowestMidi: Midi;
  /** Lowest and highest lower note over all the published variants found, obvious misprints dropped. */
  readonly spread: { readonly low: Midi; readonly high: Midi };
}

export const LOW_INTERVAL_LIMITS_SOURCE =
  'Dick Lowell & Ken Pullig, Arranging for Large Jazz Ensemble (2003); the same notes in Gary Lindsay, Jazz ' +
  'Arranging Techniques (2005). Taken from three agreeing second-hand transcriptions; m9 to M10 rest on one ' +
  'source; the printed page itself was not seen.';

function line(
  interval: string,
  semitones: Semitones,
  lowest: string,
  lowestMidi: Midi,
  low: Midi = lowestMidi,
  high: Midi = lowestMidi,
): LowIntervalLimit {
  return { interval, semitones, lowest, lowestMidi, spread: { low, high } };
}

/**
 * The published chart: the lowest placing of each interval that stays clear. Unison and octave have none.
 * @source see {@link LOW_INTERVAL_LIMITS_SOURCE}
 */
export const LOW_INTERVAL_LIMITS: readonly LowIntervalLimit[] = [
  line('m2', 1, 'E3', 52),
  line('M2', 2, 'Eb3', 51),
  line('m3', 3, 'C3', 48, 48, 49),
  line('M3', 4, 'Bb2', 46, 45, 47),
  line('P4', 5, 'Bb2', 46, 40, 46),
  line('A4/d5', 6, 'Bb2', 46, 46, 47),
  line('P5', 7, 'Bb1', 34, 33, 37),
  line('m6', 8, 'G2', 43, 41, 43),
  line('M6', 9, 'F2', 41, 40, 41),
  line('m7', 10, 'F2', 41),
  line('M7', 11, 'F2', 41),
  line('m9', 13, 'E2', 40),
  line('M9', 14, 'Eb2', 39),
  line('m10', 15, 'C2', 36),
  line('M10', 16, 'Bb1', 34),
];
