import { amplitudeOf } from '@/audio/levels';
import type { Decibels } from '#shared/units';

/** The share of the loss at full scale that the browser's compressor gives back, as an exponent. */
const GIVEN_BACK = 0.6;

/**
 * What a browser's compressor adds to every level, so that it can be taken off again and what stays under the
 * threshold leaves as it came.
 * @param threshold ≤ 0, against full scale; the knee is 0
 * @param ratio ≥ 1
 * @returns a factor of amplitude
 * @source Web Audio API 1.1, DynamicsCompressorNode, "computing the makeup gain": (1 / full range gain) ^ 0.6
 * @example makeUpGain(0, 20) // 1
 */
export function makeUpGain(threshold: Decibels, ratio: number): number {
  const fullRangeGain = amplitudeOf(threshold - threshold / ratio);
  return (1 / fullRangeGain) ** GIVEN_BACK;
}
