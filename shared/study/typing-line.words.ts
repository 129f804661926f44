import type { NoteNaming } from '#shared/pitch/display';
import { pitchName } from '#shared/pitch/names';
import { readNote } from '#shared/pitch/reading';
import type { Section } from '#shared/strings/sections';
import { readSection } from '#shared/study/section-names';
import { bracketAt } from '#shared/study/typing-line.brackets';
import { readHow, type HowSetting, type NamedString } from '#shared/study/typing-line.how';

/** Something in the line that cannot be read, and where: `text.slice(start, end)`. */
export interface TypingFault {
  readonly start: number;
  readonly end: number;
  /** A whole sentence for beside the field. */
  readonly message: string;
}

/** A setting with the place where it was said. */
export interface SaidHow {
  readonly setting: HowSetting | NamedString;
  readonly start: number;
  readonly end: number;
}

/** One thing in the line, in the order typed. */
export type Word = { readonly start: number; readonly end: number } & (
  | { readonly kind: 'section'; readonly section: Section }
  | { readonly kind: 'note'; readonly pitch: string }
  | { readonly kind: 'join' }
  | { readonly kind: 'how'; readonly said: readonly SaidHow[]; readonly faults: readonly TypingFault[] }
  | { readonly kind: 'fault'; readonly message: string }
);

/** A hyphen separates too, unless a figure follows: `D-2` is an impossible octave and not two words. */
const BETWEEN = /(?:[\s,;:|/()\]–—]|-(?!\d))+/uy;
const WORD = /(?:[^\s,;:|/()[\]–—+-]|-(?=\d))+/uy;
const NOTE = /^(.*?)(-?\d+)$/u;
const MAX_OCTAVE = 8;

function faultOfName(word: string, name: string, naming: NoteNaming): string {
  const isH = name.toLowerCase() === 'h' && naming !== 'german';
  if (isH) return `“${word}” is not a note here: write B, or choose German note names.`;
  return `“${word}” is neither a note, such as Bb2, nor a section, such as Vc.`;
}

function withoutOctave(word: string): string {
  if (word === 'f') return '“f” needs its octave, such as f3; for forte write [f] after the note.';
  return `“${word}” needs its octave, such as ${word}3.`;
}

/**
 * Reads a word as a note with its octave.
 * @returns the spelt pitch in scientific notation, or why the word is none
 * @example readPitch('b♭2', 'english') // { pitch: 'Bb2' }
 */
export function readPitch(word: string, naming: NoteNaming): { pitch: string } | { message: string } {
  const match = NOTE.exec(word);
  const name = match?.[1] ?? word;
  const note = readNote(name, naming);
  if (!note) return { message: faultOfName(word, name, naming) };
  if (!match) return { message: withoutOctave(word) };
  const octave = Number(match[2]);
  if (octave < 0 || octave > MAX_OCTAVE) {
    return { message: `“${word}”: octaves run from 0 to 8; middle C is C4.` };
  }
  return { pitch: pitchName({ ...note, octave }) };
}

function matchAt(regex: RegExp, text: string, start: number): string {
  regex.lastIndex = start;
  return regex.exec(text)?.[0] ?? '';
}

function howAt(text: string, start: number, naming: NoteNaming): Word | null {
  if (text.charAt(start) === '[') return { kind: 'how', start, ...bracketAt(text, start, naming) };
  const read = readHow(text, start, 'outside', naming);
  if (!read) return null;
  const { setting, end } = read;
  if ('fault' in setting) return { kind: 'fault', start, end, message: setting.fault };
  return { kind: 'how', start, end, said: [{ setting, start, end }], faults: [] };
}

function sectionAt(text: string, start: number): Word | null {
  const named = readSection(text, start);
  if (!named) return null;
  const { section, end } = named;
  if (section !== 'violins') return { kind: 'section', section, start, end };
  return { kind: 'fault', start, end, message: 'First or second violins? Write Vn1 or Vn2.' };
}

function wordAt(text: string, start: number, naming: NoteNaming): Word {
  if (text.charAt(start) === '+') return { kind: 'join', start, end: start + 1 };
  const known = sectionAt(text, start) ?? howAt(text, start, naming);
  if (known) return known;
  const word = matchAt(WORD, text, start);
  const read = readPitch(word, naming);
  const place = { start, end: start + word.length };
  return 'pitch' in read ? { kind: 'note', ...place, ...read } : { kind: 'fault', ...place, ...read };
}

/**
 * Cuts the line into sections, notes, joins, words on how a note is played, and what can be read as none of them.
 * @param text as typed
 * @param naming how the reader names notes
 * @returns the words in their order with their places
 * @example wordsOf('Vc A2+F3', 'english').length // 4
 */
export function wordsOf(text: string, naming: NoteNaming): readonly Word[] {
  const words: Word[] = [];
  let at = matchAt(BETWEEN, text, 0).length;
  while (at < text.length) {
    const word = wordAt(text, at, naming);
    words.push(word);
    at = word.end + matchAt(BETWEEN, text, word.end).length;
  }
  return words;
}
