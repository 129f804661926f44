import { z } from 'zod';
import type { NoteNaming } from '#shared/pitch/display';
import type { DraftDocument } from '#shared/study/draft';
import type { Reach } from '#shared/study/dealing';
import { addChordAfter, copyChord } from '#shared/study/study.changes';
import { emptyChord } from '#shared/study/new-study';
import { chordSchema, MAX_VOICES, type Chord, type Voice } from '#shared/study/study.document';
import { applyTyped } from '#shared/study/typed.changes';
import { parseTypingLine } from '#shared/study/typing-line';
import { typingLineOf } from '#shared/study/typing-line.text';

/** The type under which a clip lies beside its plain text. */
export const CLIP_TYPE = 'application/x-siltline+json';
/** A page of text is no clip; this many lines are a progression. */
const MAX_LINES = 200;

/** Notes of one chord, or whole chords. */
const clipSchema = z.strictObject({
  siltline: z.literal(1),
  kind: z.enum(['voices', 'chords']),
  chords: z.array(chordSchema).min(1).max(MAX_LINES),
});
export type Clip = Pick<z.infer<typeof clipSchema>, 'kind' | 'chords'>;

/**
 * What goes to the clipboard: the notes as the line writes them, chord by chord, and the same as data.
 * @example clipTexts({ kind: 'voices', chords: [chord] }, 'english').text // 'Vc A2 F3'
 */
export function clipTexts(clip: Clip, naming: NoteNaming): { readonly text: string; readonly data: string } {
  return {
    text: clip.chords.map((chord) => typingLineOf(chord, naming)).join('\n'),
    data: JSON.stringify({ siltline: 1, ...clip }),
  };
}

/** @returns the clip that is kept as data, or `null` where it is none */
export function readClipData(data: string): Clip | null {
  try {
    const { kind, chords } = clipSchema.parse(JSON.parse(data));
    return { kind, chords };
  } catch {
    return null;
  }
}

/**
 * Reads plain text as a clip: one typed line is notes, several are chords. Links stay, ids are made.
 * @returns the clip, or `null` where a line cannot be read
 */
export function readClipText(
  text: string,
  naming: NoteNaming,
  reach: Reach,
  newId: () => string,
): Clip | null {
  const lines = text.split(/\r?\n/u).filter((line) => line.trim() !== '');
  if (lines.length === 0 || lines.length > MAX_LINES) return null;
  const read = lines.map((line) => parseTypingLine(line, naming, reach));
  if (read.some(({ voices, faults }) => faults.length > 0 || voices.length === 0)) return null;
  const chords = read.map(({ voices }) => applyTyped(emptyChord(newId()), voices, newId));
  return { kind: chords.length === 1 ? 'voices' : 'chords', chords };
}

/** @returns notes of a chord as a clip; what was joined or linked with others is so no longer */
export function clipOfVoices(chord: Chord, ids: readonly string[]): Clip {
  const voices = chord.voices.filter(({ id }) => ids.includes(id));
  return { kind: 'voices', chords: [{ ...chord, voices }] };
}

/** Numbers of double stops that the chord has not given out. */
function freeStops(chord: Chord, count: number): readonly number[] {
  const used = new Set(chord.voices.map(({ stop }) => stop));
  return Array.from({ length: used.size + count }, (_, index) => index + 1)
    .filter((stop) => !used.has(stop))
    .slice(0, count);
}

/**
 * Puts the notes of a clip into a chord, under ids of their own.
 * @returns the chord with them; the same one where it has no room for all
 */
export function pasteVoices(chord: Chord, clip: Clip, newId: () => string): Chord {
  const pasted = clip.chords.flatMap((other) => copyChord(other, newId).voices);
  if (chord.voices.length + pasted.length > MAX_VOICES) return chord;
  const stops = [...new Set(pasted.map(({ stop }) => stop).filter((stop) => stop !== null))];
  const free = freeStops(chord, stops.length);
  const renumbered = pasted.map((voice): Voice => {
    const stop = voice.stop === null ? null : (free[stops.indexOf(voice.stop)] ?? null);
    return { ...voice, stop };
  });
  return { ...chord, voices: [...chord.voices, ...renumbered] };
}

/** @returns the study with the clip's chords after another, and the id of the last of them */
export function pasteChords(
  study: DraftDocument,
  afterId: string,
  clip: Clip,
  newId: () => string,
): { readonly study: DraftDocument; readonly lastId: string } {
  let [pasted, lastId] = [study, afterId];
  for (const chord of clip.chords) {
    const copy = copyChord(chord, newId);
    const next = addChordAfter(pasted, lastId, copy);
    if (next === pasted) break;
    [pasted, lastId] = [next, copy.id];
  }
  return { study: pasted, lastId };
}
