import type { Hertz } from '#shared/units';

const MINIMUM_HZ = 24.7;
const SLOPE_PER_KHZ = 4.37;
const RATE_SCALE = 21.4;
const HZ_PER_KHZ = 1000;

/**
 * The equivalent rectangular bandwidth of the auditory filter at a frequency.
 * @returns hertz
 * @source Glasberg & Moore 1990, Hearing Research 47: ERB = 24.7 (4.37 f + 1), f in kHz
 * @example erbAt(1000) // 132.639
 */
export function erbAt(frequencyHz: Hertz): Hertz {
  return MINIMUM_HZ * ((SLOPE_PER_KHZ * frequencyHz) / HZ_PER_KHZ + 1);
}

/**
 * The number of equivalent rectangular bandwidths below a frequency.
 * @returns ERB-rate, Cams
 * @source Glasberg & Moore 1990: 21.4 lg(4.37 f + 1), f in kHz
 * @example erbRate(1000) // 15.6215
 */
export function erbRate(frequencyHz: Hertz): number {
  return RATE_SCALE * Math.log10((SLOPE_PER_KHZ * frequencyHz) / HZ_PER_KHZ + 1);
}
