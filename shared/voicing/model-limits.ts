import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { limitOnCurve } from '#shared/voicing/calibration/limit-curves';
import { modelFor } from '#shared/voicing/muddiness/models';
import type { Midi, Semitones } from '#shared/units';
import type { SectionPair } from '#shared/voicing/section-pairs';
import { pairDensity } from '#shared/voicing/section-pairs';

/** One interval's limits: the published one and the one that the model derives for two sections. */
export interface ModelLimit {
  readonly interval: string;
  readonly semitones: Semitones;
  /** The chart's lowest lower note; null for the octave, which has none. */
  readonly chart: Midi | null;
  /** The lowest lower note that stays at 50 or under; null where the index never passes 50. */
  readonly model: Midi | null;
  /** Between the keys, where the index is 50. */
  readonly exact: Midi | null;
}

const OCTAVE: Semitones = 12;
const TENTH: Semitones = 16;
/** B0, under every string, to B5, far above every limit. */
const LOWEST: Midi = 23;
const HIGHEST: Midi = 83;

/**
 * The low interval limits of two sections by the model, for the intervals from the minor second to the major
 * tenth, beside the published chart. It depends on who plays, how, and how loud against each other; players
 * alike in both cancel.
 * @param pair lower and upper section, their players, technique and dynamic
 * @returns sixteen intervals, narrow to wide
 * @source the lowest placing that stays at an index of 50, spectra continued below the sections' ranges
 */
export function modelLimits(pair: SectionPair): readonly ModelLimit[] {
  const { threshold } = modelFor(pair.a4Hz).constants;
  return Array.from({ length: TENTH }, (_, i) => i + 1).map((semitones) => {
    const printed = LOW_INTERVAL_LIMITS.find((limit) => limit.semitones === semitones);
    const exact = limitOnCurve({ lowest: LOWEST, logDensity: curveOf(pair, semitones) }, threshold);
    return {
      interval: printed?.interval ?? (semitones === OCTAVE ? 'P8' : String(semitones)),
      semitones,
      chart: printed?.lowestMidi ?? null,
      model: exact === null ? null : Math.ceil(exact),
      exact,
    };
  });
}

function curveOf(pair: SectionPair, semitones: Semitones): readonly number[] {
  return Array.from({ length: HIGHEST - LOWEST + 1 }, (_, i) =>
    Math.log(pairDensity(pair, LOWEST + i, semitones)),
  );
}
