import { HIGHEST_EASY_STOP } from '#shared/data/double-stops';
import { STRING_COLOURS } from '#shared/data/string-colours';
import { midiOfName } from '#shared/pitch/names';
import type { GradedFinding } from '#shared/strings/grades';
import { lessPlayable } from '#shared/strings/grades';
import { harmonicFinding } from '#shared/strings/harmonics';
import { openStringsOf, rangeOf } from '#shared/strings/ranges';
import type { BassKind, Section } from '#shared/strings/sections';
import { SECTION_FACTS } from '#shared/strings/sections';
import { stopFinding } from '#shared/strings/stops';
import type { Voice } from '#shared/study/study.document';
import type { Hertz, Midi } from '#shared/units';

/** One string of an instrument and how far it is used. */
export interface StringReach {
  /** 1 is the highest string. */
  readonly number: number;
  readonly open: Midi;
  /** Up to here it is used in section writing; the highest string up to the section's top. */
  readonly top: Midi;
  readonly colour: string;
}

/** @returns the strings of a section's instrument, the highest first */
export function stringReaches(section: Section, bassKind: BassKind): readonly StringReach[] {
  const { orchestralTop } = rangeOf(section, bassKind);
  const colours = STRING_COLOURS[SECTION_FACTS[section].instrument];
  return openStringsOf(section, bassKind).map((open, index) => ({
    number: index + 1,
    open,
    top: index === 0 ? orchestralTop : Math.min(open + HIGHEST_EASY_STOP, orchestralTop),
    colour: colours[index] ?? colours.at(-1) ?? '',
  }));
}

type Part = Pick<Voice, 'section' | 'pitch' | 'technique' | 'string'>;

/**
 * How playable a voice is by its pitch, its string and its technique.
 * @returns its grade with the reason
 * @source shared/data/string-ranges; harmonics by their nodes
 */
export function voiceFinding(voice: Part, bassKind: BassKind, a4Hz: Hertz): GradedFinding {
  const harmonic = harmonicFinding(voice, bassKind, a4Hz);
  if (harmonic) return harmonic;
  const midi = midiOfName(voice.pitch);
  return lessPlayable(rangeFinding(midi, voice.section, bassKind), stringFinding(midi, voice, bassKind));
}

/**
 * How playable the voices of one stop are together.
 * @param voices of one section and one stop, two or more
 */
export function stoppedFinding(voices: readonly Part[], bassKind: BassKind): GradedFinding | null {
  const [first] = voices;
  if (!first || voices.length < 2) return null;
  const notes = voices.map(({ pitch }) => midiOfName(pitch));
  return stopFinding(notes, SECTION_FACTS[first.section].instrument, openStringsOf(first.section, bassKind));
}

function rangeFinding(midi: Midi, section: Section, bassKind: BassKind): GradedFinding {
  const { lowest, comfortableTop, orchestralTop, soloTop } = rangeOf(section, bassKind);
  const { plural } = SECTION_FACTS[section];
  if (midi < lowest) return { grade: 'not playable', reason: `below the lowest note of the ${plural}` };
  if (midi <= comfortableTop) return { grade: 'easy', reason: 'within the comfortable range' };
  if (midi <= orchestralTop) return { grade: 'awkward', reason: 'high for a section' };
  if (midi <= soloTop) return { grade: 'awkward', reason: 'above orchestral writing: for a soloist' };
  return { grade: 'not playable', reason: `above the highest note of the ${plural}` };
}

function stringFinding(midi: Midi, { section, string }: Part, bassKind: BassKind): GradedFinding {
  const open = string === null ? undefined : openStringsOf(section, bassKind)[string - 1];
  if (open === undefined) return { grade: 'easy', reason: 'the player chooses the string' };
  if (midi < open) return { grade: 'not playable', reason: 'below that open string' };
  if (string !== 1 && midi > open + HIGHEST_EASY_STOP) {
    return { grade: 'awkward', reason: 'very high on that string' };
  }
  return { grade: 'easy', reason: 'lies on that string' };
}
