import { techniqueLevel } from '#shared/acoustics/technique';
import { DYNAMIC_LEVELS, FORTE_POWER_LEVEL } from '#shared/data/player-levels';
import type { Instrument } from '#shared/strings/sections';
import type { Dynamic, Technique } from '#shared/study/study.document';
import type { Decibels, Hertz } from '#shared/units';

const DB_PER_POWER_DECADE = 10;
/** @source J. Meyer 2009, from memory: at 3 kHz 1.1 dB for each dB at the bottom of the spectrum */
const BRIGHTNESS_DB_PER_DB = 0.1;
const BRIGHTNESS_TOP_HZ = 3000;
/** Up to here lie a string's strongest partials, with which the spectrum grows as a whole; from memory. */
const BRIGHTNESS_BOTTOM_HZ = 1000;

/**
 * Level gained by several equal players.
 * @source incoherent sources, 10 lg N: Howard & Angus, Acoustics and Psychoacoustics, example 1.12
 * @example playersGain(2) // 3.0103
 */
export function playersGain(players: number): Decibels {
  return DB_PER_POWER_DECADE * Math.log10(players);
}

/**
 * The nominal level of a voice: what its players give, before the body shapes it.
 * @param players 1 or more
 * @returns decibels; 0 is one violinist at mf
 * @source shared/data/player-levels
 * @example nominalLevel('violin', 'mf', ordinary, 1) // 0
 */
export function nominalLevel(
  instrument: Instrument,
  dynamic: Dynamic,
  technique: Technique,
  players: number,
): Decibels {
  const ofInstrument = FORTE_POWER_LEVEL[instrument] - FORTE_POWER_LEVEL.violin;
  return ofInstrument + DYNAMIC_LEVELS[dynamic] + techniqueLevel(technique) + playersGain(players);
}

/**
 * How much more than the bottom of the spectrum a frequency grows with the dynamic.
 * @returns decibels, 0 at mf
 * @source J. Meyer 2009, from memory
 * @example brightnessGain('f', 3000) // 0.5
 */
export function brightnessGain(dynamic: Dynamic, frequencyHz: Hertz): Decibels {
  const inside = Math.min(Math.max(frequencyHz, BRIGHTNESS_BOTTOM_HZ), BRIGHTNESS_TOP_HZ);
  const way = Math.log(inside / BRIGHTNESS_BOTTOM_HZ) / Math.log(BRIGHTNESS_TOP_HZ / BRIGHTNESS_BOTTOM_HZ);
  return BRIGHTNESS_DB_PER_DB * DYNAMIC_LEVELS[dynamic] * way;
}
