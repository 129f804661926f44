import type { Hertz } from '#shared/units';

const HZ_PER_KHZ = 1000;
const FIRST_SCALE = 13;
const FIRST_RATE = 0.76;
const SECOND_SCALE = 3.5;
const SECOND_KHZ = 7.5;
const WIDTH_FLOOR_HZ = 25;
const WIDTH_SCALE_HZ = 75;
const WIDTH_RATE = 1.4;
const WIDTH_EXPONENT = 0.69;

/**
 * Critical-band rate.
 * @returns Bark
 * @source Zwicker & Terhardt 1980, JASA 68: 13 atan(0.76 f) + 3.5 atan((f / 7.5)²), f in kHz
 * @example criticalBandRate(50) // 0.4939
 */
export function criticalBandRate(frequencyHz: Hertz): number {
  const k = frequencyHz / HZ_PER_KHZ;
  return FIRST_SCALE * Math.atan(FIRST_RATE * k) + SECOND_SCALE * Math.atan((k / SECOND_KHZ) ** 2);
}

/**
 * Critical bandwidth. Below 200 Hz the equivalent rectangular bandwidth is to be preferred: this is too wide.
 * @returns hertz
 * @source Zwicker & Terhardt 1980: 25 + 75 (1 + 1.4 f²)^0.69, f in kHz
 * @example criticalBandwidth(200) // 102.873
 */
export function criticalBandwidth(frequencyHz: Hertz): Hertz {
  const k = frequencyHz / HZ_PER_KHZ;
  return WIDTH_FLOOR_HZ + WIDTH_SCALE_HZ * (1 + WIDTH_RATE * k ** 2) ** WIDTH_EXPONENT;
}
