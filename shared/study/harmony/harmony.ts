import type { Letter } from '#shared/pitch/names';
import { LETTER_SEMITONES } from '#shared/pitch/names';
import type { ReadNote } from '#shared/pitch/reading';
import type { Semitones } from '#shared/units';

/** A tone of a chord by its degree above the root: 1, 3, 5, 7, 9 … and its semitones, unfolded. */
export interface ChordTone {
  readonly degree: number;
  readonly semitones: Semitones;
}

/** A chord before anybody plays it: what a symbol or a numeral names. */
export interface Harmony {
  readonly root: ReadNote;
  /** From the root up. */
  readonly tones: readonly ChordTone[];
  /** What stands lowest: the root, another tone of the chord, or a note of its own. */
  readonly bass: ReadNote;
}

/** Something that cannot be read, counted from the beginning of what was read. */
export interface HarmonyFault {
  readonly start: number;
  readonly end: number;
  readonly message: string;
}

export type ReadHarmony = { readonly harmony: Harmony } | { readonly fault: HarmonyFault };

export const LETTERS: readonly Letter[] = ['C', 'D', 'E', 'F', 'G', 'A', 'B'];
const SEMITONES_PER_OCTAVE: Semitones = 12;
const TRITONE: Semitones = 6;
/** More than a double accidental has no sign: such a tone is spelt by a neighbour's letter. */
const MAX_ALTERATION = 2;

/** @returns semitones above C, within the octave */
export function chroma({ letter, alteration }: ReadNote): Semitones {
  return (LETTER_SEMITONES[letter] + alteration + SEMITONES_PER_OCTAVE) % SEMITONES_PER_OCTAVE;
}

function onLetter(letter: Letter, semitones: Semitones): ReadNote {
  const off = (((semitones - LETTER_SEMITONES[letter]) % SEMITONES_PER_OCTAVE) + SEMITONES_PER_OCTAVE) % 12;
  return { letter, alteration: off > TRITONE ? off - SEMITONES_PER_OCTAVE : off };
}

/**
 * A tone of a chord by its name: on the letter that its degree wants, or, where that would take three
 * accidentals, on the next one.
 * @example toneName({ letter: 'G', alteration: 0 }, { degree: 3, semitones: 4 }) // B
 */
export function toneName(root: ReadNote, { degree, semitones }: ChordTone): ReadNote {
  const steps = LETTERS.indexOf(root.letter) + degree - 1;
  const wanted = chroma(root) + semitones;
  const [own, above, below] = [0, 1, LETTERS.length - 1].map((aside) =>
    onLetter(LETTERS[(steps + aside) % LETTERS.length] ?? 'C', wanted),
  );
  const spelt = [own, above, below].find((name) => name && Math.abs(name.alteration) <= MAX_ALTERATION);
  return spelt ?? root;
}

/** @returns the tone of the chord that sounds so, or `undefined` for a note that is none of them */
export function toneOf(
  { root, tones }: Pick<Harmony, 'root' | 'tones'>,
  note: ReadNote,
): ChordTone | undefined {
  return tones.find((tone) => (chroma(root) + tone.semitones) % SEMITONES_PER_OCTAVE === chroma(note));
}
