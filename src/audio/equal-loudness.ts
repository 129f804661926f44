import { amplitudeOf } from '@/audio/levels';
import { levelOfPhon } from '#shared/hearing/iso-226-2003';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { Decibels, Hertz } from '#shared/units';

/** A comfortable listening level, at which the weights of low and high partials are taken. Chosen. */
const LISTENING_PHON = 60;
const REFERENCE_HZ: Hertz = 1000;
/** The standard's contours end here; what lies beyond is weighed as at the end. */
const CONTOUR = { low: 20, high: 12500 } as const;
const DB_PER_DECADE_OF_ENERGY = 10;

/** How much weaker a partial is heard than one of the same level at 1 kHz. */
function weightOf(frequencyHz: Hertz): Decibels {
  const within = Math.min(Math.max(frequencyHz, CONTOUR.low), CONTOUR.high);
  return levelOfPhon(LISTENING_PHON, REFERENCE_HZ) - levelOfPhon(LISTENING_PHON, within);
}

/**
 * How loud a chord is, as one level: the energy of its partials, each weighed by the equal-loudness contour of
 * 60 phon. An approximation: masking and the width of the critical bands are left out.
 * @returns decibels on the partials' own scale, −Infinity where nothing sounds
 * @source weights by ISO 226:2003; the sum of weighed energies is common practice of sound level meters
 * @example weighedLevel([]) // -Infinity
 */
export function weighedLevel(sounds: readonly VoiceSound[]): Decibels {
  const energy = sounds
    .flatMap(({ partials }) => partials)
    .reduce((sum, { frequencyHz, levelDb }) => sum + amplitudeOf(levelDb + weightOf(frequencyHz)) ** 2, 0);
  return DB_PER_DECADE_OF_ENERGY * Math.log10(energy);
}

/** What is taken off each of two chords so that they are equally loud. */
export interface EqualLoudness {
  readonly a: Decibels;
  readonly b: Decibels;
}

/**
 * Makes two chords equally loud by taking the louder one back: nothing is ever raised.
 * @returns ≤ 0 each, one of them 0; both 0 where one is silent
 * @example equalLoudness(chord, chord) // { a: 0, b: 0 }
 */
export function equalLoudness(a: readonly VoiceSound[], b: readonly VoiceSound[]): EqualLoudness {
  const louder = weighedLevel(a) - weighedLevel(b);
  if (!Number.isFinite(louder)) return { a: 0, b: 0 };
  return { a: Math.min(-louder, 0) + 0, b: Math.min(louder, 0) + 0 };
}
