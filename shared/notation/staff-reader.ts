import type { InForce } from '#shared/notation/accidentals';
import { clefRuns } from '#shared/notation/clef-runs';
import {
  newWords,
  ORDINARY_STATE,
  playingState,
  soundingWords,
  type PlayingState,
} from '#shared/notation/playing-words';
import { sectionLines } from '#shared/notation/section-lines';
import { staffChord, type StaffChord } from '#shared/notation/staff-chord';
import type { Stretch } from '#shared/notation/stretches';
import type { NotatedStudy } from '#shared/notation/system-plan';
import type { NoteNaming } from '#shared/pitch/display';
import type { Letter } from '#shared/pitch/names';
import type { Clef } from '#shared/strings/clefs';
import type { Section } from '#shared/strings/sections';
import type { Chord, Dynamic } from '#shared/study/study.document';

/** What a staff has at one moment of a bar. */
export interface StaffMoment {
  readonly chord: StaffChord | null;
  readonly clef: Clef;
  /** Words that stand here, since they are new. */
  readonly words: readonly string[];
  /** Dynamics that stand here, since they are new; from the highest line. */
  readonly dynamics: readonly Dynamic[];
}

/** One staff, read from left to right: what is in force is remembered from moment to moment. */
export class StaffReader {
  private inForce: InForce = new Map();
  private bar = -1;
  private state: PlayingState = ORDINARY_STATE;
  private dynamics = '';
  private readonly clefs: readonly Clef[];

  constructor(
    private readonly section: Section,
    private readonly study: NotatedStudy,
    private readonly naming: NoteNaming,
    private readonly signature: ReadonlyMap<Letter, number>,
    chords: readonly Chord[],
  ) {
    this.clefs = clefRuns(chords, section, study.ensemble.bass);
  }

  /**
   * @param stretch the next in order
   * @param starts whether its first note is meant; the others are tied to it
   * @returns what is written there
   */
  read({ chord, place, bar, first }: Stretch, starts: boolean): StaffMoment {
    if (bar !== this.bar) this.inForce = new Map();
    this.bar = bar;
    const clef = this.clefs[Math.min(place, this.clefs.length - 1)] ?? 'treble';
    const lines = sectionLines(chord?.voices ?? [], this.section);
    if (!chord || lines.length === 0) return { chord: null, clef, words: [], dynamics: [] };
    const { ensemble } = this.study;
    // A tied head has no accidental, in a new bar neither, and sets nothing for what follows.
    const tied = !(first && starts);
    const rules = { clef, bass: ensemble.bass, signature: this.signature, dynamic: chord.dynamic };
    const set = staffChord(lines, { ...rules, inForce: this.inForce });
    if (tied) return { chord: withoutAccidentals(set.chord), clef, words: [], dynamics: [] };
    this.inForce = set.inForce;
    const state = playingState(lines, ensemble, this.naming);
    const words = [...newWords(this.state, state), ...soundingWords(lines, this.naming)];
    this.state = state;
    const dynamics = set.chord?.dynamics ?? [];
    const changed = dynamics.join() !== this.dynamics;
    this.dynamics = dynamics.join();
    return { chord: set.chord, clef, words, dynamics: changed ? dynamics : [] };
  }
}

function withoutAccidentals(chord: StaffChord | null): StaffChord | null {
  return chord && { ...chord, notes: chord.notes.map((note) => ({ ...note, accidental: null })) };
}
