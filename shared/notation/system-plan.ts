import { signatureAlterations, signatureOf } from '#shared/notation/key-signature';
import { ticksOf, valuesOf, type NoteValue } from '#shared/notation/note-values';
import { newWords, ORDINARY_STATE, playingState, soundingWords } from '#shared/notation/playing-words';
import { sectionLines } from '#shared/notation/section-lines';
import { staffChord, type StaffChord } from '#shared/notation/staff-chord';
import { midiOfName } from '#shared/pitch/names';
import type { NoteNaming } from '#shared/pitch/display';
import { clefOf, type Clef } from '#shared/strings/clefs';
import { SECTIONS, type Section } from '#shared/strings/sections';
import type { DraftDocument } from '#shared/study/draft';
import type { Chord } from '#shared/study/study.document';

/** One chord on one staff of the system. */
export interface StaffPlan {
  readonly section: Section;
  readonly clef: Clef;
  /** Sharps, or flats where negative. */
  readonly signature: number;
  readonly chord: StaffChord | null;
  /** Over the staff. */
  readonly words: readonly string[];
}

/** One chord on five staves, without bars. */
export interface SystemPlan {
  readonly chordId: string;
  readonly staves: readonly StaffPlan[];
  /** The chord's length as notes tied to each other. */
  readonly values: readonly NoteValue[];
}

/** What of a study its notation depends on. */
export type NotatedStudy = Pick<DraftDocument, 'key' | 'metre' | 'ensemble'>;

/**
 * Plans one chord as it stands alone: each staff with its clef, its heads, and every word that is in force.
 * @param chord may be empty: its staves are then silent
 * @param study key, metre and ensemble
 * @param naming how the reader names notes
 * @returns the five staves from the top
 * @example systemPlan(chord, study, 'english').staves[4].clef // 'bass'
 */
export function systemPlan(chord: Chord, study: NotatedStudy, naming: NoteNaming): SystemPlan {
  const { bass } = study.ensemble;
  const signature = signatureOf(study.key);
  const staves = SECTIONS.map((section) => {
    const lines = sectionLines(chord.voices, section);
    const clef = clefOf(
      section,
      lines.flat().map(({ pitch }) => midiOfName(pitch)),
    );
    const alterations = signatureAlterations(signature);
    const rules = { clef, bass, signature: alterations, inForce: new Map(), dynamic: chord.dynamic };
    const state = playingState(lines, study.ensemble, naming);
    const words = [...newWords(ORDINARY_STATE, state), ...soundingWords(lines, naming)];
    return { section, clef, signature, chord: staffChord(lines, rules).chord, words };
  });
  const { unit } = study.metre;
  const ticks = Math.max(Math.round(ticksOf(chord.beats, unit)), 1);
  return { chordId: chord.id, staves, values: valuesOf(0, ticks, ticksOf(1, unit)) };
}
