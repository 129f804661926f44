import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { midiOfName } from '#shared/pitch/names';
import { SECTIONS, type Section } from '#shared/strings/sections';
import { dealToSections, type Reach } from '#shared/study/dealing';
import { TYPED_SECTIONS } from '#shared/study/section-names';
import { MAX_VOICES, type Chord, type Voice } from '#shared/study/study.document';
import { wordsOf, type TypingFault, type Word } from '#shared/study/typing-line.words';

/** A voice as the line gives it. */
export interface TypedVoice {
  readonly section: Section;
  /** Spelt, in scientific notation. */
  readonly pitch: string;
  /** The same number in one section: one double stop. */
  readonly stop: number | null;
}

/** What a line says; with faults it says nothing yet. */
export interface TypedLine {
  readonly voices: readonly TypedVoice[];
  readonly faults: readonly TypingFault[];
}

/** Notes that are played together: one note, or those of a double stop. */
interface Group {
  readonly section: Section | null;
  readonly notes: { readonly pitch: string; readonly start: number; readonly end: number }[];
}

type Reading = { groups: Group[]; faults: TypingFault[]; section: Section | null; named: boolean };

function isNote(word: Word | undefined): boolean {
  // An unreadable note beside a + is already a fault of its own.
  return word?.kind === 'note' || word?.kind === 'fault';
}

function readOne(reading: Reading, word: Word, index: number, words: readonly Word[]): void {
  const { start, end } = word;
  const before = words[index - 1];
  if (word.kind === 'fault') reading.faults.push({ start, end, message: word.message });
  if (word.kind === 'section') {
    reading.section = word.section;
    reading.named = true;
    const next = words[index + 1];
    if (!isNote(next)) reading.faults.push({ start, end, message: 'No note follows this section.' });
  }
  if (word.kind === 'join' && !(isNote(before) && isNote(words[index + 1]))) {
    reading.faults.push({ start, end, message: 'A + stands between the notes of a double stop: A2+F3.' });
  }
  if (word.kind !== 'note') return;
  const note = { pitch: word.pitch, start, end };
  const last = reading.groups.at(-1);
  if (before?.kind === 'join' && last) last.notes.push(note);
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

function voicesOf(groups: readonly Group[]): TypedVoice[] {
  let stops = 0;
  return groups.flatMap(({ section, notes }) => {
    const stop = notes.length > 1 ? ++stops : null;
    return section === null ? [] : notes.map(({ pitch }) => ({ section, pitch, stop }));
  });
}

/**
 * Reads the line in which a chord is typed: `DB D2, Vc A2 F3, Va A3` (notes of one section are divided),
 * `Vc A2+F3` (a double stop), or a bare list, dealt to the sections from the bottom.
 * @param text as typed
 * @param naming how the reader names notes
 * @param reach where each section plays comfortably, for dealing
 * @returns the voices; or every fault in the order of the line, and no voices
 * @example parseTypingLine('Vc A2+F3', 'english', reach).voices.length // 2
 */
export function parseTypingLine(text: string, naming: NoteNaming, reach: Reach): TypedLine {
  const reading: Reading = { groups: [], faults: [], section: null, named: false };
  wordsOf(text, naming).forEach((word, index, words) => readOne(reading, word, index, words));
  const faults = [...reading.faults, ...withoutSection(reading), ...tooMany(reading)];
  if (faults.length > 0) return { voices: [], faults: faults.sort((a, b) => a.start - b.start) };
  return { voices: voicesOf(reading.named ? reading.groups : dealt(reading.groups, reach)), faults: [] };
}

function sectionText(voices: readonly Voice[], naming: NoteNaming): string {
  const written = new Set<number>();
  return voices
    .filter(({ stop }) => stop === null || (!written.has(stop) && written.add(stop)))
    .map((voice) => (voice.stop === null ? [voice] : voices.filter(({ stop }) => stop === voice.stop)))
    .map((together) => together.map(({ pitch }) => displayPitch(pitch, naming)).join('+'))
    .join(' ');
}

/**
 * The inverse: a chord as the line would be typed, from the bottom of the score.
 * @example typingLineOf(chord, 'english') // 'DB D2, Vc A2+F3, Va A3'
 */
export function typingLineOf(chord: Pick<Chord, 'voices'>, naming: NoteNaming): string {
  return [...SECTIONS]
    .reverse()
    .map((section) => ({ section, voices: chord.voices.filter((voice) => voice.section === section) }))
    .filter(({ voices }) => voices.length > 0)
    .map(({ section, voices }) => `${TYPED_SECTIONS[section]} ${sectionText(voices, naming)}`)
    .join(', ');
}
