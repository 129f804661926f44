import type { LowIntervalLimit } from '#shared/data/low-interval-limits';
import type { Midi } from '#shared/units';
import { twoCelloSections } from '#shared/voicing/calibration/yardsticks';
import type { MuddinessModel } from '#shared/voicing/muddiness/model';
import { peakDensity } from '#shared/voicing/muddiness/model';

/** How cloudy an interval is at each placing, from the lowest to the highest lower note tried. */
export interface LimitCurve {
  readonly limit: LowIntervalLimit;
  readonly lowest: Midi;
  /** The natural logarithm of the highest ρ, by semitones from there. */
  readonly logDensity: readonly number[];
}

/** From C1, far under every limit of the chart, to D4, far above. */
const LOWEST: Midi = 24;
const HIGHEST: Midi = 62;

/** @returns the curve of each interval of the chart for two like cello sections */
export function limitCurves(
  model: MuddinessModel,
  limits: readonly LowIntervalLimit[],
): readonly LimitCurve[] {
  return limits.map((limit) => ({
    limit,
    lowest: LOWEST,
    logDensity: Array.from({ length: HIGHEST - LOWEST + 1 }, (_, i) =>
      Math.log(peakDensity(model, twoCelloSections(LOWEST + i, limit.semitones))),
    ),
  }));
}

/**
 * The model's limit: the highest lower note at which ρ falls through the threshold, with no crossing above.
 * @param curve its lower notes a semitone apart
 * @param threshold T
 * @returns a MIDI number between the keys, interpolated in log ρ; null where ρ never falls through
 * @example limitOnCurve({ lowest: 40, logDensity: [1, -1] }, 1) // 40.5
 */
export function limitOnCurve(
  { lowest, logDensity }: Pick<LimitCurve, 'lowest' | 'logDensity'>,
  threshold: number,
): Midi | null {
  const level = Math.log(threshold);
  for (let i = logDensity.length - 1; i > 0; i -= 1) {
    const above = logDensity[i] ?? -Infinity;
    const below = logDensity[i - 1] ?? -Infinity;
    if (above >= level) return null;
    if (below >= level) return lowest + i - 1 + (below - level) / (below - above);
  }
  return null;
}

/**
 * @returns semitones from a limit to the nearest published variant of it; 0 within their spread
 * @example fromNearestVariant(38, fifth) // 1: the variants of the fifth go up to C#2, 37
 */
export function fromNearestVariant(midi: Midi, { spread }: LowIntervalLimit): number {
  return midi - Math.min(Math.max(midi, spread.low), spread.high);
}
