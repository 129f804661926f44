import type { NoteNaming } from '#shared/pitch/display';
import { isLetter, type Letter } from '#shared/pitch/names';

/** A name without its octave, read. */
export interface ReadNote {
  readonly letter: Letter;
  readonly alteration: number;
}

const SYLLABLES = new Map<string, Letter>(
  Object.entries({
    do: 'C',
    ut: 'C',
    re: 'D',
    ré: 'D',
    mi: 'E',
    fa: 'F',
    sol: 'G',
    la: 'A',
    si: 'B',
  }),
);

const SIGNED = new Map<string, number>(
  Object.entries({
    '': 0,
    b: -1,
    '♭': -1,
    bb: -2,
    '♭♭': -2,
    '𝄫': -2,
    '#': 1,
    '♯': 1,
    '##': 2,
    '♯♯': 2,
    x: 2,
    '𝄪': 2,
  }),
);
/** German endings, those of a vowel (Es, As) included. */
const ENDINGS = new Map<string, number>(
  Object.entries({ '': 0, is: 1, isis: 2, es: -1, eses: -2, s: -1, ses: -2 }),
);

function signed(stem: Letter | undefined, sign: string): ReadNote | null {
  const alteration = SIGNED.get(sign);
  return stem === undefined || alteration === undefined ? null : { letter: stem, alteration };
}

function readLetter(text: string): ReadNote | null {
  const letter = text.charAt(0).toUpperCase();
  return signed(isLetter(letter) ? letter : undefined, text.slice(1));
}

function readSyllable(text: string): ReadNote | null {
  const syllable = [...SYLLABLES.keys()].find((known) => text.startsWith(known));
  return syllable === undefined ? null : signed(SYLLABLES.get(syllable), text.slice(syllable.length));
}

/** B is the flattened H; with a sign of its own, B is read as in English, since nothing else is meant. */
function readGerman(text: string): ReadNote | null {
  if (text === 'b') return { letter: 'B', alteration: -1 };
  const head = text.charAt(0);
  const letter = head === 'h' ? 'B' : head.toUpperCase();
  if (!isLetter(letter)) return null;
  const ending = text.slice(1);
  const vowelOnly = ending === 's' || ending === 'ses';
  if (vowelOnly && letter !== 'A' && letter !== 'E') return null;
  const alteration = ENDINGS.get(ending);
  return alteration === undefined ? signed(letter, ending) : { letter, alteration };
}

/**
 * Reads a note's name without its octave, forgiving of case and of how the accidental is written.
 * @param text e.g. `Bb`, `b♭`, `F##`; in German `Es`, `H`; in solfège `sol#`
 * @param naming how the reader names notes
 * @returns the letter and its alteration, or `null` where it is not a name
 * @example readNote('es', 'german') // { letter: 'E', alteration: -1 }
 */
export function readNote(text: string, naming: NoteNaming): ReadNote | null {
  const lower = text.toLowerCase();
  if (naming === 'german') return readGerman(lower);
  return (naming === 'solfege' ? readSyllable(lower) : null) ?? readLetter(lower);
}
