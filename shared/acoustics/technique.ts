import { bowForceLevel, ORDINARY_ROLL_OFF_OCTAVES } from '#shared/acoustics/bow';
import type { Technique } from '#shared/study/study.document';
import type { Decibels, Hertz } from '#shared/units';

/** @source Schoonderwaldt 2009, fig. 5: the roll-off moves by 0.4 octaves, sul tasto down, sul ponticello up */
const CONTACT_SHIFT_OCTAVES = 0.4;

/** From memory of players' practice: over the fingerboard the bow stands about a fifth of the string away. */
const TASTO_POINT = 1 / 5;
const TASTO_DIP_DB = 9;
const TASTO_DIP_PARTIALS = 0.8;
const TASTO_DB_PER_OCTAVE = -1.5;
/** From memory: at the bridge the lowest partials thin out and the upper ones stand forward. */
const PONTICELLO_FUNDAMENTAL_DB = -6;
const PONTICELLO_DB_PER_OCTAVE = 1.5;
/** @source Mousavion & Sarkar 2015, JASA 138: every mute tested lowers 1.5–2.5 kHz; the depth is from memory */
const MUTE_CENTRE_HZ = Math.sqrt(1500 * 2500);
const MUTE_DB = -10;
const MUTE_WIDTH_OCTAVES = 0.5;
/** From memory: fingers pluck near the end of the fingerboard, a fifth of the string from the bridge. */
const PLUCK_POINT = 1 / 5;
/** A finger is broad and a pluck never quite misses a partial. */
const PLUCK_FLOOR = 0.1;
/** Upper partials die away sooner: 3 dB per octave over the whole tone, from memory. */
const PLUCK_DB_PER_OCTAVE = -3;
const HARMONIC_DB_PER_OCTAVE = -6;
const HARMONIC_PARTIALS = 12;
const ALL_PARTIALS = 32;
/** Against ordinary bowing at the same dynamic, from memory. */
const MUTE_LEVEL_DB = -3;
const PIZZICATO_LEVEL_DB = -6;
const HARMONIC_LEVEL_DB = -6;
const TASTO_LEVEL_DB = -2;
const DB_PER_AMPLITUDE_DECADE = 20;

/**
 * @returns how many partials a technique sounds: a harmonic has fewer
 * @example partialCount({ ...ordinary, harmonic: 'natural' }) // 12
 */
export function partialCount(technique: Technique): number {
  return technique.harmonic === 'none' ? ALL_PARTIALS : HARMONIC_PARTIALS;
}

/**
 * Level of a partial at the bridge under a technique, against the fundamental of ordinary bowing.
 * @param n the partial's number
 * @param frequencyHz its frequency, for what depends on that: the mute
 * @returns decibels
 * @source see the constants of this module
 * @example excitationLevel(ordinary, 2, 880) // -6.0206: bowForceLevel(2)
 */
export function excitationLevel(technique: Technique, n: number, frequencyHz: Hertz): Decibels {
  const octave = Math.log2(n);
  const source = technique.stroke === 'pizzicato' ? pluckLevel(n) : bowedLevel(technique, n);
  const harmonic = technique.harmonic === 'none' ? 0 : HARMONIC_DB_PER_OCTAVE * octave;
  return source + harmonic + (technique.mute ? muteGain(frequencyHz) : 0);
}

/**
 * @returns level of a technique as a whole, against ordinary bowing at the same dynamic; decibels
 * @example techniqueLevel(ordinary) // 0
 */
export function techniqueLevel({ contact, mute, stroke, harmonic }: Technique): Decibels {
  return (
    (mute ? MUTE_LEVEL_DB : 0) +
    (stroke === 'pizzicato' ? PIZZICATO_LEVEL_DB : 0) +
    (harmonic === 'none' ? 0 : HARMONIC_LEVEL_DB) +
    (contact === 'sulTasto' ? TASTO_LEVEL_DB : 0)
  );
}

function bowedLevel({ contact }: Technique, n: number): Decibels {
  const octave = Math.log2(n);
  if (contact === 'sulTasto') {
    const roll = bowForceLevel(n, ORDINARY_ROLL_OFF_OCTAVES - CONTACT_SHIFT_OCTAVES);
    return roll + TASTO_DB_PER_OCTAVE * octave - TASTO_DIP_DB * dipAt(n, TASTO_POINT);
  }
  if (contact === 'sulPonticello') {
    const roll = bowForceLevel(n, ORDINARY_ROLL_OFF_OCTAVES + CONTACT_SHIFT_OCTAVES);
    return roll + PONTICELLO_DB_PER_OCTAVE * octave + PONTICELLO_FUNDAMENTAL_DB / n;
  }
  return bowForceLevel(n);
}

/** 1 where a partial has a node at the bowing point, less beside it. */
function dipAt(n: number, point: number): number {
  const distance = n - Math.max(Math.round(n * point), 1) / point;
  return Math.exp(-((distance / TASTO_DIP_PARTIALS) ** 2) / 2);
}

/** @source force at the bridge of a string plucked at a point: |sin(nπp)| / n */
function pluckLevel(n: number): Decibels {
  const missed = Math.max(Math.abs(Math.sin(n * Math.PI * PLUCK_POINT)), PLUCK_FLOOR);
  const relative = missed / Math.sin(Math.PI * PLUCK_POINT);
  return DB_PER_AMPLITUDE_DECADE * Math.log10(relative / n) + PLUCK_DB_PER_OCTAVE * Math.log2(n);
}

function muteGain(frequencyHz: Hertz): Decibels {
  return MUTE_DB * Math.exp(-((Math.log2(frequencyHz / MUTE_CENTRE_HZ) / MUTE_WIDTH_OCTAVES) ** 2) / 2);
}
