import type { Pitch } from '#shared/pitch/names';
import { LETTER_SEMITONES } from '#shared/pitch/names';
import type { Cents, Hertz, Semitones } from '#shared/units';

const SEMITONES_PER_OCTAVE: Semitones = 12;
const CENTS_PER_OCTAVE: Cents = 1200;
/** Fifths above C of the seven letters: F C G D A E B. */
const LETTER_FIFTHS = { F: -1, C: 0, G: 1, D: 2, A: 3, E: 4, B: 5 } as const;
/** A sharp raises a note by seven fifths (less four octaves). */
const FIFTHS_PER_SHARP = 7;
const SEMITONES_PER_FIFTH: Semitones = 7;

/**
 * @returns the size of a frequency ratio in cents
 * @example centsOf(3 / 2) // 701.955
 * @source 1200 · log2(ratio); A. J. Ellis's cent
 */
export function centsOf(ratio: number): Cents {
  return CENTS_PER_OCTAVE * Math.log2(ratio);
}

/**
 * @returns the frequency ratio of an interval in semitones
 * @example ratioOf(12) // 2
 */
export function ratioOf(semitones: Semitones): number {
  return 2 ** (semitones / SEMITONES_PER_OCTAVE);
}

/** @returns the equal-tempered semitones from one frequency up to another; negative downwards */
export function semitonesBetween(from: Hertz, to: Hertz): Semitones {
  return SEMITONES_PER_OCTAVE * Math.log2(to / from);
}

/**
 * A note's place in the chain of fifths, C being 0.
 * @example fifthsOf({ letter: 'B', alteration: -1 }) // -2
 */
export function fifthsOf(note: Pick<Pitch, 'letter' | 'alteration'>): number {
  return LETTER_FIFTHS[note.letter] + FIFTHS_PER_SHARP * note.alteration;
}

/**
 * Octaves by which a spelt pitch lies above the note that its chain of fifths from C4 would reach, unfolded.
 * @returns whole octaves
 */
export function octavesBeyondFifths(pitch: Pitch): number {
  const semitones = LETTER_SEMITONES[pitch.letter] + pitch.alteration + SEMITONES_PER_OCTAVE * pitch.octave;
  return (semitones - SEMITONES_PER_FIFTH * fifthsOf(pitch)) / SEMITONES_PER_OCTAVE;
}
