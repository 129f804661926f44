import type { Decibels } from '#shared/units';

/** @source Schoonderwaldt 2009, Acta Acustica 95, fig. 5: 4.2 octaves above the fundamental, ordinary bowing */
export const ORDINARY_ROLL_OFF_OCTAVES = 4.2;
const DB_PER_AMPLITUDE_DECADE = 20;

/**
 * Level of a partial of the bow's force at the bridge, against the fundamental: 1/n, as of ideal stick-slip
 * motion, and 12 dB per octave beyond the roll-off.
 * @param n the partial's number, 1 or more
 * @param rollOffOctaves octaves above the fundamental where the roll-off starts
 * @returns decibels, 0 for the fundamental
 * @source Helmholtz 1863; Cremer, The Physics of the Violin (1/n); Schoonderwaldt 2009 (roll-off)
 * @example bowForceLevel(2) // -6.0206
 */
export function bowForceLevel(n: number, rollOffOctaves: number = ORDINARY_ROLL_OFF_OCTAVES): Decibels {
  const beyond = Math.max(n / 2 ** rollOffOctaves, 1);
  return -DB_PER_AMPLITUDE_DECADE * Math.log10(n * beyond);
}
