import type { Instrument } from '#shared/strings/sections';
import type { Semitones } from '#shared/units';

/** How far a hand reaches on an instrument. */
export interface HandSpan {
  /** Nut to bridge. */
  readonly stringLengthMm: number;
  /** Finger distances up to which a stop is easy, awkward, and just possible. */
  readonly easyMm: number;
  readonly awkwardMm: number;
  readonly hardMm: number;
  /** From here up, both notes, the thumb joins and spans are one grade wider; null where it never does. */
  readonly thumbFrom: Semitones | null;
}

/**
 * @source from memory of players' practice, adjusted to the 50,482 two-note stops of 122 quartets (OpenScore
 *   String Quartets, CC0), of which 95 to 99 % come out easy
 */
export const HAND_SPANS: Readonly<Record<Instrument, HandSpan>> = {
  violin: { stringLengthMm: 327, easyMm: 76, awkwardMm: 95, hardMm: 115, thumbFrom: null },
  viola: { stringLengthMm: 372, easyMm: 84, awkwardMm: 100, hardMm: 120, thumbFrom: null },
  cello: { stringLengthMm: 692, easyMm: 100, awkwardMm: 132, hardMm: 175, thumbFrom: 7 },
  doubleBass: { stringLengthMm: 1060, easyMm: 106, awkwardMm: 135, hardMm: 175, thumbFrom: 9 },
};

/** With one string open, up to an octave on its neighbour is easy. */
export const EASY_BESIDE_OPEN: Semitones = 12;
/** Higher than this above an open string a stop is awkward at best. */
export const HIGHEST_EASY_STOP: Semitones = 17;
