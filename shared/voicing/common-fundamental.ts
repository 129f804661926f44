import { centsOf } from '#shared/pitch/intervals';
import type { Cents, Hertz } from '#shared/units';

/** The fundamental of which all notes of a chord are whole multiples. */
export interface CommonFundamental {
  readonly frequencyHz: Hertz;
  /** Which multiple each note is, in the order given. */
  readonly multiples: readonly number[];
}

/** Tempered thirds and sixths lie 14 to 16 cents off their ratios, the tempered tritone 17. */
const TOLERANCE: Cents = 18;
/** Beyond this the ratio is no longer simple. */
const HIGHEST_LOWEST_MULTIPLE = 16;
/** Near here pitch itself ends. @source Pressnitzer, Patterson & Krumbholz 2001, from memory: near 30 Hz */
export const LOWER_LIMIT_OF_PITCH: Hertz = 30;

/**
 * The fundamental that a chord's notes share in simple whole-number ratios: it tells why an interval clouds
 * where it does. For the limits of the fifth, the thirds and the major sixth in the chart it lies near the lower
 * limit of pitch.
 * @param frequencies of the notes
 * @returns the highest such fundamental; null where there is none, or no note
 * @source arithmetic
 * @example commonFundamental([58.27, 87.31]) // 29.1 Hz: the fifth Bb1–F2 is 2 : 3
 */
export function commonFundamental(frequencies: readonly Hertz[]): CommonFundamental | null {
  if (frequencies.length === 0) return null;
  const lowest = Math.min(...frequencies);
  for (let multiple = 1; multiple <= HIGHEST_LOWEST_MULTIPLE; multiple += 1) {
    const frequencyHz = lowest / multiple;
    const multiples = frequencies.map((frequency) => Math.round(frequency / frequencyHz));
    const fits = multiples.every(
      (n, i) => Math.abs(centsOf((frequencies[i] ?? 0) / (n * frequencyHz))) <= TOLERANCE,
    );
    if (fits) return { frequencyHz, multiples };
  }
  return null;
}
