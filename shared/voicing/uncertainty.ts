import { LOG_DENSITY_UNCERTAINTY, MUDDINESS_CONSTANTS } from '#shared/data/muddiness-constants';
import { densityOfIndex, indexOf } from '#shared/voicing/muddiness/scores';

/** Where an index may lie: one standard deviation to either side. */
export interface IndexBand {
  readonly low: number;
  readonly high: number;
}

/** Two bands that share more than this part of the narrower one show no clear difference. */
const CLEAR_OVERLAP = 0.5;
/** Figures are shown as whole points: less than one is no difference, however sure. */
const LEAST_DIFFERENCE = 1;

/**
 * The band of an index. The fit misses the chart by so much, and the published variants spread by so much, that
 * ρ is known to a factor; the band is what the index would be with ρ that much lower or higher.
 * @param index 0 … 100
 * @source leave-one-out refits and the published spread; see shared/data/muddiness-constants
 * @example bandOf(50) // about 45 to 55
 */
export function bandOf(index: number): IndexBand {
  const { threshold } = MUDDINESS_CONSTANTS;
  const density = densityOfIndex(index, threshold);
  return {
    low: indexOf(density * Math.exp(-LOG_DENSITY_UNCERTAINTY), threshold),
    high: indexOf(density * Math.exp(LOG_DENSITY_UNCERTAINTY), threshold),
  };
}

/**
 * @returns half the width of an index's band, points
 * @example uncertaintyOf(0) // 0
 */
export function uncertaintyOf(index: number): number {
  const { low, high } = bandOf(index);
  return (high - low) / 2;
}

/**
 * Whether two indices differ clearly.
 * @returns false where they are less than a point apart, or their bands overlap by more than half of the narrower
 * @example differClearly(50, 50.9) // false
 */
export function differClearly(a: number, b: number): boolean {
  if (Math.abs(a - b) < LEAST_DIFFERENCE) return false;
  const one = bandOf(a);
  const other = bandOf(b);
  const overlap = Math.min(one.high, other.high) - Math.max(one.low, other.low);
  const narrower = Math.min(one.high - one.low, other.high - other.low);
  return overlap <= CLEAR_OVERLAP * narrower;
}

/** Halvings that leave an index known to a ten-thousandth of a point. */
const HALVINGS = 20;

/**
 * @returns an index just above the highest that lies clearly below another: all from there up to the other do not
 *   differ from it clearly
 * @example differClearly(clearlyBelow(80), 80) // false, and true a thousandth of a point lower
 */
export function clearlyBelow(index: number): number {
  let clear = 0;
  let unclear = index;
  for (let i = 0; i < HALVINGS; i += 1) {
    const middle = (clear + unclear) / 2;
    if (differClearly(middle, index)) clear = middle;
    else unclear = middle;
  }
  return unclear;
}
