import { EXTENSION_LOWEST, FIFTH_STRING, STRING_RANGES } from '#shared/data/string-ranges';
import { midiOfName } from '#shared/pitch/names';
import type { BassKind, Section } from '#shared/strings/sections';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { Midi } from '#shared/units';

/** The reach of a section, by sounding pitch. */
export interface SectionRange {
  readonly lowest: Midi;
  readonly comfortableTop: Midi;
  readonly orchestralTop: Midi;
  readonly soloTop: Midi;
}

/**
 * How far a section reaches.
 * @param bassKind the kind of double bass; no other section depends on it
 * @returns sounding MIDI numbers
 * @source shared/data/string-ranges
 * @example rangeOf('cello', 'four-string').lowest // 36, C2
 */
export function rangeOf(section: Section, bassKind: BassKind): SectionRange {
  const range = STRING_RANGES[SECTION_FACTS[section].instrument];
  return {
    lowest: lowestOf(section, bassKind),
    comfortableTop: midiOfName(range.comfortableTop),
    orchestralTop: midiOfName(range.orchestralTop),
    soloTop: midiOfName(range.soloTop),
  };
}

/**
 * The open strings of a section's instrument, the highest (string 1) first. With the low extension the
 * fourth string of the double bass is its C1, fingered or latched.
 * @returns sounding MIDI numbers
 * @example openStringsOf('viola', 'four-string') // [69, 62, 55, 48]
 */
export function openStringsOf(section: Section, bassKind: BassKind): readonly Midi[] {
  const strings = STRING_RANGES[SECTION_FACTS[section].instrument].openStrings.map(midiOfName);
  if (section !== 'doubleBass') return strings;
  if (bassKind === 'five-string') return [...strings, midiOfName(FIFTH_STRING)];
  if (bassKind === 'extension') return [...strings.slice(0, -1), midiOfName(EXTENSION_LOWEST)];
  return strings;
}

function lowestOf(section: Section, bassKind: BassKind): Midi {
  return Math.min(...openStringsOf(section, bassKind));
}
