import type { NoteNaming } from '#shared/pitch/display';
import { midiOfName } from '#shared/pitch/names';
import type { Section } from '#shared/strings/sections';
import { dealToSections, type Reach } from '#shared/study/dealing';
import { MAX_VOICES } from '#shared/study/study.document';
import type { TypedHow } from '#shared/study/typing-line.how';
import { howOf, playedWords, type PlayedWord, type SaidNote } from '#shared/study/typing-line.notes';
import { wordsOf, type SaidHow, type TypingFault } from '#shared/study/typing-line.words';

/** A voice as the line gives it. */
export interface TypedVoice {
  readonly section: Section;
  /** Spelt, in scientific notation. */
  readonly pitch: string;
  /** The same number in one section: one double stop. */
  readonly stop: number | null;
  /** How it is played; where nothing is said of it, a voice that stood there keeps its own. */
  readonly how?: TypedHow;
}

/** What a line says; with faults it says nothing yet. */
export interface TypedLine {
  readonly voices: readonly TypedVoice[];
  readonly faults: readonly TypingFault[];
}

/** Notes that are played together: one note, or those of a double stop. */
interface Group {
  readonly section: Section | null;
  readonly notes: SaidNote[];
}

interface Reading {
  readonly groups: Group[];
  readonly faults: TypingFault[];
  section: Section | null;
  /** What is said of all notes of the section. */
  said: readonly SaidHow[];
  named: boolean;
}

function isNote(played: PlayedWord | undefined): boolean {
  // An unreadable note beside a + is already a fault of its own.
  return played?.word.kind === 'note' || played?.word.kind === 'fault';
}

function readOne(
  reading: Reading,
  { word, said }: PlayedWord,
  index: number,
  all: readonly PlayedWord[],
): void {
  const { start, end } = word;
  const before = all[index - 1];
  if (word.kind === 'fault') reading.faults.push({ start, end, message: word.message });
  if (word.kind === 'section') {
    Object.assign(reading, { section: word.section, said, named: true });
    if (!isNote(all[index + 1]))
      reading.faults.push({ start, end, message: 'No note follows this section.' });
  }
  if (word.kind === 'join' && !(isNote(before) && isNote(all[index + 1]))) {
    reading.faults.push({ start, end, message: 'A + stands between the notes of a double stop: A2+F3.' });
  }
  if (word.kind !== 'note') return;
  const note = { pitch: word.pitch, start, end, said: [...reading.said, ...said] };
  const last = reading.groups.at(-1);
  if (before?.word.kind === 'join' && last) last.notes.push(note);
  else reading.groups.push({ section: reading.section, notes: [note] });
}

function withoutSection({ groups, named }: Reading): TypingFault[] {
  if (!named) return [];
  return groups
    .filter((group) => group.section === null)
    .flatMap((group) => group.notes)
    .map(({ start, end }) => ({ start, end, message: 'Say which section plays this note, such as DB.' }));
}

function tooMany({ groups }: Reading): TypingFault[] {
  const rest = groups.flatMap((group) => group.notes).slice(MAX_VOICES);
  const [first, last] = [rest.at(0), rest.at(-1)];
  if (!first || !last) return [];
  return [{ start: first.start, end: last.end, message: `A chord has at most ${MAX_VOICES} voices.` }];
}

function lowest(group: Group): number {
  return Math.min(...group.notes.map((note) => midiOfName(note.pitch)));
}

function dealt(groups: readonly Group[], reach: Reach): Group[] {
  const upwards = [...groups].sort((a, b) => lowest(a) - lowest(b));
  const midis = upwards.map((group) => group.notes.map((note) => midiOfName(note.pitch)));
  const sections = dealToSections(midis, reach);
  return upwards.map((group, index) => ({ ...group, section: sections[index] ?? null }));
}

function voicesOf(groups: readonly Group[], naming: NoteNaming): TypedLine {
  let stops = 0;
  const faults: TypingFault[] = [];
  const voices = groups.flatMap(({ section, notes }) => {
    const stop = notes.length > 1 ? ++stops : null;
    if (section === null) return [];
    return notes.map(({ pitch, said }) => {
      const { how, faults: ofStrings } = howOf(said, section, naming);
      faults.push(...ofStrings);
      return { section, pitch, stop, how };
    });
  });
  return { voices, faults };
}

/**
 * Reads the line in which a chord is typed: `DB D2, Vc A2 F3, Va A3` (notes of one section are divided),
 * `Vc A2+F3` (a double stop), `Vc A2[solo pp]` (how it is played), or a bare list, dealt to the sections from
 * the bottom.
 * @param text as typed
 * @param naming how the reader names notes
 * @param reach where each section plays comfortably, for dealing
 * @returns the voices; or every fault in the order of the line, and no voices
 * @example parseTypingLine('Vc A2+F3', 'english', reach).voices.length // 2
 */
export function parseTypingLine(text: string, naming: NoteNaming, reach: Reach): TypedLine {
  const { played, faults: ofWords } = playedWords(wordsOf(text, naming));
  const reading: Reading = { groups: [], faults: [...ofWords], section: null, said: [], named: false };
  played.forEach((word, index, all) => readOne(reading, word, index, all));
  const read = [...reading.faults, ...withoutSection(reading), ...tooMany(reading)];
  const { voices, faults } = voicesOf(reading.named ? reading.groups : dealt(reading.groups, reach), naming);
  const all = [...read, ...faults];
  if (all.length > 0) return { voices: [], faults: all.sort((a, b) => a.start - b.start) };
  return { voices, faults: [] };
}
