import { noteName, type NoteNaming } from '#shared/pitch/display';
import { spellIn } from '#shared/pitch/spelling';
import { openStringsOf } from '#shared/strings/ranges';
import { BASS_KINDS, SECTION_FACTS, type Section } from '#shared/strings/sections';
import { LETTER_SEMITONES } from '#shared/pitch/names';
import { PLAIN_HOW, withSetting, type TypedHow } from '#shared/study/typing-line.how';
import type { SaidHow, TypingFault, Word } from '#shared/study/typing-line.words';

/** A note of the line with all that is said of it. */
export interface SaidNote {
  readonly pitch: string;
  readonly start: number;
  readonly end: number;
  readonly said: readonly SaidHow[];
}

const SEMITONES = 12;
const C_MAJOR = { tonic: 'C', mode: 'major' } as const;

/** A word that is not about how another is played, with those that follow it and are. */
export interface PlayedWord {
  readonly word: Exclude<Word, { readonly kind: 'how' }>;
  readonly said: readonly SaidHow[];
}

/**
 * Hangs what is said of notes on the word before: on a note, or on a section for all of its notes.
 * @returns the words with what is said of each, and the faults of what is said
 */
export function playedWords(words: readonly Word[]): {
  readonly played: readonly PlayedWord[];
  readonly faults: readonly TypingFault[];
} {
  const played: { word: PlayedWord['word']; said: SaidHow[] }[] = [];
  const faults: TypingFault[] = [];
  for (const word of words) {
    if (word.kind !== 'how') {
      played.push({ word, said: [] });
      continue;
    }
    faults.push(...word.faults);
    const last = played.at(-1);
    if (last && last.word.kind !== 'join') last.said.push(...word.said);
    else {
      const message = 'Say first which note is played so: write this after the note or the section.';
      faults.push({ start: word.start, end: word.end, message });
    }
  }
  return { played, faults };
}

/** The number of an open string by its name, whatever the kind of the double bass. */
function stringNumber(section: Section, semitones: number): number | null {
  for (const bass of BASS_KINDS) {
    const index = openStringsOf(section, bass).findIndex((open) => open % SEMITONES === semitones);
    if (index >= 0) return index + 1;
  }
  return null;
}

function stringNames(section: Section, naming: NoteNaming): string {
  const names = openStringsOf(section, 'four-string').map((open) => noteName(spellIn(open, C_MAJOR), naming));
  return names.join(', ');
}

/** The string that is meant, if one is; none where the section has no such string. */
function meantString(setting: SaidHow['setting'], section: Section): number | null | 'missing' {
  if ('openString' in setting) {
    const { letter, alteration } = setting.openString;
    return stringNumber(section, LETTER_SEMITONES[letter] + alteration) ?? 'missing';
  }
  const string = setting.string ?? null;
  return string !== null && string > openStringsOf(section, 'five-string').length ? 'missing' : string;
}

/**
 * What is said of a note, taken together, for the section that plays it.
 * @param naming how the reader names notes
 * @returns how it is played, and a fault for each string that the section does not have
 */
export function howOf(
  said: readonly SaidHow[],
  section: Section,
  naming: NoteNaming,
): { readonly how: TypedHow; readonly faults: readonly TypingFault[] } {
  const faults: TypingFault[] = [];
  let how = PLAIN_HOW;
  for (const { setting, start, end } of said) {
    const string = meantString(setting, section);
    if (string === 'missing') {
      const message = `The ${SECTION_FACTS[section].plural} have no such string; they have ${stringNames(section, naming)}.`;
      faults.push({ start, end, message });
    } else how = withSetting(how, 'openString' in setting ? { string } : setting);
  }
  return { how, faults };
}
