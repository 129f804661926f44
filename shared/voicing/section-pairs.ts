import { equalTempered } from '#shared/pitch/tuning';
import { nominalLevel } from '#shared/acoustics/level';
import type { Section } from '#shared/strings/sections';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { Dynamic, Technique } from '#shared/study/study.document';
import type { Hertz, Midi, Semitones } from '#shared/units';
import { joinUnisons } from '#shared/voicing/muddiness/joined';
import type { Joinable } from '#shared/voicing/muddiness/joined';
import { peakDensity } from '#shared/voicing/muddiness/model';
import { modelFor } from '#shared/voicing/muddiness/models';
import { indexOf } from '#shared/voicing/muddiness/scores';
import { toneKey } from '#shared/voicing/sound';

/** A section by how it plays, whatever it plays. */
export interface PlayingSection {
  readonly section: Section;
  readonly players: number;
  readonly technique: Technique;
  readonly dynamic: Dynamic;
}

/** Two sections, one below the other. */
export interface SectionPair {
  readonly lower: PlayingSection;
  readonly upper: PlayingSection;
  readonly a4Hz: Hertz;
}

/**
 * The index of two notes played by two sections, alone, in equal temperament; spectra are continued beyond the
 * sections' ranges.
 * @param lower the lower note
 * @param semitones how far above it the upper one lies, 0 or more
 * @returns 0 … 100
 */
export function pairIndex(pair: SectionPair, lower: Midi, semitones: Semitones): number {
  const { threshold } = modelFor(pair.a4Hz).constants;
  return indexOf(pairDensity(pair, lower, semitones), threshold);
}

/** @returns the highest ρ of two notes played by two sections; see {@link pairIndex} */
export function pairDensity({ lower, upper, a4Hz }: SectionPair, midi: Midi, semitones: Semitones): number {
  const notes = [noteOf(lower, midi, a4Hz), noteOf(upper, midi + semitones, a4Hz)];
  return peakDensity(modelFor(a4Hz), joinUnisons(notes, a4Hz));
}

function noteOf({ section, players, technique, dynamic }: PlayingSection, midi: Midi, a4Hz: Hertz): Joinable {
  const { instrument } = SECTION_FACTS[section];
  const source = { instrument, technique, dynamic, f0Hz: equalTempered(midi, a4Hz) };
  const nominalDb = nominalLevel(instrument, dynamic, technique, players);
  return { ...source, toneKey: toneKey(source), nominalDb };
}
