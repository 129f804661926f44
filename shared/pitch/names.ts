import type { Midi } from '#shared/units';

/** The notes of the scale and their semitones above C. */
export const LETTER_SEMITONES = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 } as const;
export type Letter = keyof typeof LETTER_SEMITONES;

/** A spelt, sounding pitch in scientific notation: C4 is middle C. */
export interface Pitch {
  readonly letter: Letter;
  /** Semitones by which the accidental alters the letter: −2 double flat … +2 double sharp. */
  readonly alteration: number;
  readonly octave: number;
}

/** Scientific notation as the study document keeps it: `Bb2`, `F#3`, `Cx4` never, `C##4` yes. */
export const PITCH_PATTERN = /^([A-G])(bb|b|##|#)?(-?\d)$/;

const ALTERATIONS: Readonly<Record<string, number>> = { '': 0, b: -1, bb: -2, '#': 1, '##': 2 };
const SIGNS: Readonly<Record<string, string>> = { '0': '', '-1': 'b', '-2': 'bb', '1': '#', '2': '##' };

/**
 * Reads a pitch in scientific notation.
 * @param name e.g. `Bb2`; the only form kept in documents and sent over the wire
 * @returns the pitch, or `null` where the name is not one
 * @example parsePitch('Bb2') // { letter: 'B', alteration: -1, octave: 2 }
 */
export function parsePitch(name: string): Pitch | null {
  const match = PITCH_PATTERN.exec(name);
  if (!match) return null;
  const [, letter, sign = '', octave] = match;
  const alteration = ALTERATIONS[sign];
  if (!isLetter(letter) || alteration === undefined) return null;
  return { letter, alteration, octave: Number(octave) };
}

/** Whether a text is one of the seven letters. */
export function isLetter(text: string | undefined): text is Letter {
  return text !== undefined && text in LETTER_SEMITONES;
}

/**
 * @returns the sounding MIDI number of a pitch
 * @example midiOf({ letter: 'C', alteration: 0, octave: 4 }) // 60
 * @source MIDI 1.0: note 60 is middle C, C4
 */
export function midiOf(pitch: Pitch): Midi {
  return 12 * (pitch.octave + 1) + LETTER_SEMITONES[pitch.letter] + pitch.alteration;
}

/**
 * @param name a pitch in scientific notation
 * @returns its MIDI number
 * @throws RangeError where the name is not a pitch
 * @example midiOfName('Bb2') // 46
 */
export function midiOfName(name: string): Midi {
  const pitch = parsePitch(name);
  if (!pitch) throw new RangeError(`not a pitch: ${name}`);
  return midiOf(pitch);
}

/**
 * @returns the pitch in scientific notation, the inverse of {@link parsePitch}
 * @example pitchName({ letter: 'B', alteration: -1, octave: 2 }) // 'Bb2'
 */
export function pitchName(pitch: Pitch): string {
  return `${pitch.letter}${SIGNS[String(pitch.alteration)] ?? ''}${pitch.octave}`;
}
