import type { Hertz } from '#shared/units';

const SCALE = 26.81;
const HALF_HZ = 1960;
const OFFSET = 0.53;
const LOW_END = 2;
const LOW_CORRECTION = 0.15;
const HIGH_END = 20.1;
const HIGH_CORRECTION = 0.22;

/**
 * Critical-band rate.
 * @returns Bark, with the end corrections
 * @source Traunmüller 1990, JASA 88: 26.81 f / (1960 + f) − 0.53; below 2 and above 20.1 Bark corrected
 * @example traunmuller1990(50) // 0.4164
 */
export function traunmuller1990(frequencyHz: Hertz): number {
  const bark = (SCALE * frequencyHz) / (HALF_HZ + frequencyHz) - OFFSET;
  if (bark < LOW_END) return bark + LOW_CORRECTION * (LOW_END - bark);
  return bark > HIGH_END ? bark + HIGH_CORRECTION * (bark - HIGH_END) : bark;
}
