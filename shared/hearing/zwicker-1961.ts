import { ZWICKER_BANDS } from '#shared/data/critical-bands';
import type { CriticalBand } from '#shared/data/critical-bands';
import type { Hertz } from '#shared/units';

/**
 * The critical band in which a frequency lies.
 * @returns the band, or null above 15.5 kHz and below 0
 * @source Zwicker 1961, JASA 33: 248
 * @example bandOf(440)?.bark // 5
 */
export function bandOf(frequencyHz: Hertz): CriticalBand | null {
  return ZWICKER_BANDS.find(({ lowHz, highHz }) => frequencyHz >= lowHz && frequencyHz < highHz) ?? null;
}
