import type { Decibels } from '#shared/units';

/** Playback starts here every time the page is opened: with headphones on, loud is worse than faint. Chosen. */
export const QUIET_START: Decibels = -24;
export const LOWEST_VOLUME: Decibels = -60;
/** The volume only takes away: a chord of full level comes out as it is. */
export const HIGHEST_VOLUME: Decibels = 0;

/**
 * @param peak against full scale, −Infinity in silence
 * @returns how much of a level meter is filled, 0 … 1: from {@link LOWEST_VOLUME} to full scale
 * @example meterFill(-30) // 0.5
 */
export function meterFill(peak: Decibels): number {
  return Math.min(Math.max(1 - peak / LOWEST_VOLUME, 0), 1);
}

/** @returns the volume within its bounds; the lowest where it is no number */
export function boundedVolume(volume: Decibels): Decibels {
  if (Number.isNaN(volume)) return LOWEST_VOLUME;
  return Math.min(Math.max(volume, LOWEST_VOLUME), HIGHEST_VOLUME);
}
