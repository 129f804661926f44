import { parsePitch, type Letter, type Pitch } from '#shared/pitch/names';

/** How the reader names notes: B♭ and B, B and H, or si♭ and si. */
export const NOTE_NAMINGS = ['english', 'german', 'solfege'] as const;
export type NoteNaming = (typeof NOTE_NAMINGS)[number];

const SIGNS: Readonly<Record<number, string>> = { [-2]: '♭♭', [-1]: '♭', 0: '', 1: '♯', 2: '♯♯' };
const SPOKEN: Readonly<Record<number, string>> = {
  [-2]: ' double flat',
  [-1]: ' flat',
  0: '',
  1: ' sharp',
  2: ' double sharp',
};

const SOLFEGE: Readonly<Record<Letter, string>> = {
  C: 'do',
  D: 'ré',
  E: 'mi',
  F: 'fa',
  G: 'sol',
  A: 'la',
  B: 'si',
};

/** German names: endings -is and -es, shortened after a vowel, and B for the flattened H. */
function german(letter: Letter, alteration: number): string {
  if (letter === 'B' && alteration === -1) return 'B';
  const stem = letter === 'B' ? 'H' : letter;
  if (alteration >= 0) return stem + 'is'.repeat(alteration);
  const first = stem === 'A' || stem === 'E' ? 's' : 'es';
  return stem + first + 'es'.repeat(-alteration - 1);
}

/**
 * @param pitch spelt
 * @param naming how the reader names notes
 * @returns the name without its octave
 * @source German and French names: common practice
 * @example noteName({ letter: 'B', alteration: -1, octave: 2 }, 'german') // 'B'
 */
export function noteName(pitch: Pitch, naming: NoteNaming): string {
  if (naming === 'german') return german(pitch.letter, pitch.alteration);
  const stem = naming === 'solfege' ? SOLFEGE[pitch.letter] : pitch.letter;
  return stem + (SIGNS[pitch.alteration] ?? '');
}

/**
 * @param name a pitch in scientific notation, as documents keep it
 * @returns the name as the reader sees it, with its octave; a name that is not a pitch stays as it is
 * @example displayPitch('Bb2', 'english') // 'B♭2'
 */
export function displayPitch(name: string, naming: NoteNaming): string {
  const pitch = parsePitch(name);
  return pitch ? `${noteName(pitch, naming)}${pitch.octave}` : name;
}

/**
 * @returns the name to be read aloud, accidentals in words
 * @example spokenPitch('Bb2', 'english') // 'B flat 2'
 */
export function spokenPitch(name: string, naming: NoteNaming): string {
  const pitch = parsePitch(name);
  if (!pitch) return name;
  if (naming === 'german') return displayPitch(name, naming);
  const stem = naming === 'solfege' ? SOLFEGE[pitch.letter] : pitch.letter;
  return `${stem}${SPOKEN[pitch.alteration] ?? ''} ${pitch.octave}`;
}
