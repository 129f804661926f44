import type { Instrument } from '#shared/strings/sections';

/**
 * How each open string's colour is described, the highest string first.
 * @source from memory of orchestration handbooks
 */
export const STRING_COLOURS: Readonly<Record<Instrument, readonly string[]>> = {
  violin: [
    'brilliant, penetrating',
    'clear, gentle, lyrical',
    'warm, mellow, least brilliant',
    'rich, dark, somewhat harsh when forced',
  ],
  viola: [
    'penetrating, slightly nasal',
    'mellow, muted',
    'dusky, neutral, good for accompaniment',
    'dark, sombre, austere',
  ],
  cello: ['bright, singing, intense', 'warm, sweet', 'sombre, less strong', 'full, dark, sonorous'],
  doubleBass: ['most penetrating', 'clearer', 'slightly dull', 'dark, heavy, slightly dull'],
};
