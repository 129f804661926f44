import type { Decibels, Hertz } from '#shared/units';

const HZ_PER_KHZ = 1000;
const LOW_SCALE = 3.64;
const LOW_EXPONENT = -0.8;
const DIP = 6.5;
const DIP_KHZ = 3.3;
const DIP_RATE = 0.6;
const HIGH_SCALE = 1e-3;
const HIGH_EXPONENT = 4;

/**
 * The threshold in quiet.
 * @param frequencyHz above 0
 * @returns dB SPL
 * @source Terhardt 1979, Hearing Research 1: 3.64 f^−0.8 − 6.5 e^(−0.6 (f − 3.3)²) + 0.001 f⁴, f in kHz
 * @example thresholdInQuiet(20) // 83.219
 */
export function thresholdInQuiet(frequencyHz: Hertz): Decibels {
  const k = frequencyHz / HZ_PER_KHZ;
  return (
    LOW_SCALE * k ** LOW_EXPONENT -
    DIP * Math.exp(-DIP_RATE * (k - DIP_KHZ) ** 2) +
    HIGH_SCALE * k ** HIGH_EXPONENT
  );
}
