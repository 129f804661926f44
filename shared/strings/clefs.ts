import type { Section } from '#shared/strings/sections';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { Midi, Semitones } from '#shared/units';

export type Clef = 'treble' | 'alto' | 'tenor' | 'bass';

/** The double bass is written an octave above where it sounds. */
const DOUBLE_BASS_WRITTEN_ABOVE: Semitones = 12;

/**
 * From these written notes up a passage leaves its ordinary clef.
 * @source measured on 407,895 viola and 326,863 cello notes of OpenScore scores (CC0): alto passages reach E flat
 *   5 and bass-clef ones F sharp 4 at the 99th percentile; tenor passages have their median at E4
 */
const VIOLA_TREBLE: Midi = 74;
const TENOR: Midi = 64;
const TREBLE: Midi = 72;

/** @returns the written pitch of a section's sounding pitch */
export function writtenMidi(section: Section, sounding: Midi): Midi {
  return section === 'doubleBass' ? sounding + DOUBLE_BASS_WRITTEN_ABOVE : sounding;
}

/**
 * The clef in which a passage of a section is written: its ordinary one, unless all of it lies high.
 * @param sounding pitches of the passage
 * @example clefOf('cello', [67, 71]) // 'tenor'
 */
export function clefOf(section: Section, sounding: readonly Midi[]): Clef {
  const { instrument } = SECTION_FACTS[section];
  if (instrument === 'violin') return 'treble';
  const lowest = Math.min(...sounding.map((midi) => writtenMidi(section, midi)));
  const high = Number.isFinite(lowest);
  if (instrument === 'viola') return high && lowest >= VIOLA_TREBLE ? 'treble' : 'alto';
  if (!high || lowest < TENOR) return 'bass';
  return lowest >= TREBLE ? 'treble' : 'tenor';
}
