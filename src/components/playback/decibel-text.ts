import type { Decibels } from '#shared/units';

/**
 * @returns a level as it is shown, with a true minus sign
 * @example decibelText(-24) // '−24 dB'
 */
export function decibelText(level: Decibels): string {
  const rounded = Math.round(level);
  return `${rounded < 0 ? '−' : ''}${Math.abs(rounded)} dB`;
}
