import type { ScoreChord } from '#shared/data/score-chords';
import { midiOfName } from '#shared/pitch/names';
import { equalTempered } from '#shared/pitch/tuning';
import type { Instrument, Section } from '#shared/strings/sections';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { Dynamic, Ensemble, Technique } from '#shared/study/study.document';
import { DEFAULT_ENSEMBLE } from '#shared/study/study.document';
import type { Hertz, Midi } from '#shared/units';
import { dealToSections } from '#shared/study/dealing';
import { comfortableReach } from '#shared/study/reach';
import { nominalLevel } from '#shared/acoustics/level';
import type { Joinable } from '#shared/voicing/muddiness/joined';
import { joinUnisons } from '#shared/voicing/muddiness/joined';
import type { MuddinessVoice } from '#shared/voicing/muddiness/model';

/** The tables were made for concert pitch. */
export const CALIBRATION_A4: Hertz = 440;
/** Sections of one size, so that no balance colours the yardsticks. */
const PLAYERS = 8;

const ORDINARY: Technique = { contact: 'ordinary', mute: false, stroke: 'sustained', harmonic: 'none' };

/** The lowest keys of the octaves 2, 3 and 4. */
const C2: Midi = 36;
const C3: Midi = 48;
const C4: Midi = 60;

/**
 * The section that takes a note where a yardstick names none: basses, cellos, violas, violins by octaves.
 * @example sectionFor(36) // 'cello': C2
 */
export function sectionFor(midi: Midi): Section {
  if (midi < C2) return 'doubleBass';
  if (midi < C3) return 'cello';
  return midi < C4 ? 'viola' : 'violin1';
}

/** A section's note, bowed ordinarily in equal temperament. */
function noteOf(instrument: Instrument, midi: Midi, players: number, dynamic: Dynamic = 'mf'): Joinable {
  const f0Hz = equalTempered(midi, CALIBRATION_A4);
  return {
    toneKey: `${instrument} ordinary ${dynamic} ${f0Hz}`,
    f0Hz,
    instrument,
    technique: ORDINARY,
    dynamic,
    nominalDb: nominalLevel(instrument, dynamic, ORDINARY, players),
  };
}

/**
 * Two like cello sections, whose spectrum is continued below their range.
 * @param lower sounding pitch of the lower one
 */
export function twoCelloSections(lower: Midi, semitones: number): readonly MuddinessVoice[] {
  const notes = [lower, lower + semitones].map((midi) => noteOf('cello', midi, PLAYERS));
  return joinUnisons(notes, CALIBRATION_A4);
}

/** A voicing of one section a note, each of eight players. */
export function voicingOf(midi: readonly Midi[], dynamic: Dynamic = 'mf'): readonly MuddinessVoice[] {
  const notes = midi.map((note) =>
    noteOf(SECTION_FACTS[sectionFor(note)].instrument, note, PLAYERS, dynamic),
  );
  return joinUnisons(notes, CALIBRATION_A4);
}

/** The same from names: `C2 G2 E3`. */
export function namedVoicing(names: string, dynamic: Dynamic = 'mf'): readonly MuddinessVoice[] {
  return voicingOf(names.split(' ').map(midiOfName), dynamic);
}

/** A chord of a score: the notes of one part share its players. */
export function scoreVoicing(
  chord: ScoreChord,
  ensemble: Ensemble = DEFAULT_ENSEMBLE,
): readonly MuddinessVoice[] {
  const notes = chord.parts.flatMap(([section, pitches]) =>
    pitches.map((pitch) => sharedNote(section, midiOfName(pitch), pitches.length, ensemble)),
  );
  return joinUnisons(notes, CALIBRATION_A4);
}

/**
 * A voicing dealt as an orchestra deals it, from the bottom with the basses; notes of one section share its
 * players.
 * @param midi rising
 * @example dealtVoicing([36, 43])[0]?.key // 'doubleBass ordinary mf 65.4…'
 */
export function dealtVoicing(
  midi: readonly Midi[],
  ensemble: Ensemble = DEFAULT_ENSEMBLE,
): readonly MuddinessVoice[] {
  const sections = dealToSections(
    midi.map((note) => [note]),
    comfortableReach(ensemble.bass),
  );
  const notes = midi.flatMap((note, i) => {
    const section = sections[i];
    if (!section) return [];
    return [sharedNote(section, note, sections.filter((other) => other === section).length, ensemble)];
  });
  return joinUnisons(notes, CALIBRATION_A4);
}

/** A note of a section that divides into some notes. */
function sharedNote(section: Section, midi: Midi, notes: number, { players }: Ensemble): Joinable {
  return noteOf(SECTION_FACTS[section].instrument, midi, players[section] / notes);
}
