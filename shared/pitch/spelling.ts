import { fifthsOf } from '#shared/pitch/intervals';
import { LETTER_SEMITONES, parsePitch, type Letter, type Pitch } from '#shared/pitch/names';
import type { Mode } from '#shared/study/study.document';
import type { Midi } from '#shared/units';

/** What spelling follows: the study's key. */
export interface SpellingKey {
  /** A letter with at most one accidental: `Bb`. */
  readonly tonic: string;
  readonly mode: Mode;
}

/** The letters in the order of fifths, from F. */
const FIFTHS: readonly Letter[] = ['F', 'C', 'G', 'D', 'A', 'E', 'B'];
const LETTERS = FIFTHS.length;
const PITCH_CLASSES = 12;
/** Semitones of a fifth. */
const FIFTH = 7;
/** From the tonic down to the flat second on the line of fifths: where the chromatic scale begins. */
const FLAT_SECOND = -5;
/** Locrian alone has a flat fifth, one further down. */
const FLAT_FIFTH = -6;

/** The place of a tonic on the line of fifths, C = 0, G = 1, F = −1. */
function fifthOf(tonic: string): number {
  const pitch = parsePitch(`${tonic}4`);
  if (!pitch) throw new RangeError(`not a tonic: ${tonic}`);
  return fifthsOf(pitch);
}

/** The remainder that is never negative. */
function modulo(value: number, by: number): number {
  return ((value % by) + by) % by;
}

/**
 * Spells a key of the keyboard as the study's key wants it: the notes of the mode as they stand in it, the
 * others as in the harmonic chromatic scale (flat second, third, sixth and seventh, sharp fourth).
 * @param midi sounding, whole
 * @param key the study's key
 * @returns the spelt pitch
 * @throws RangeError where the pitch is not a whole number or the tonic is none
 * @source harmonic chromatic scale: common practice
 * @example spellIn(46, { tonic: 'F', mode: 'major' }) // { letter: 'B', alteration: -1, octave: 2 }
 */
export function spellIn(midi: Midi, key: SpellingKey): Pitch {
  if (!Number.isInteger(midi)) throw new RangeError(`not a key of the keyboard: ${midi}`);
  const lowest = fifthOf(key.tonic) + (key.mode === 'locrian' ? FLAT_FIFTH : FLAT_SECOND);
  const above = modulo(midi * FIFTH - lowest, PITCH_CLASSES);
  const place = lowest + above + 1;
  const letter = FIFTHS[modulo(place, LETTERS)] ?? 'C';
  const alteration = Math.floor(place / LETTERS);
  const octave = (midi - LETTER_SEMITONES[letter] - alteration) / PITCH_CLASSES - 1;
  return { letter, alteration, octave };
}
