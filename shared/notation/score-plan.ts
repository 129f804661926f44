import type { InForce } from '#shared/notation/accidentals';
import { clefRuns } from '#shared/notation/clef-runs';
import { signatureAlterations, signatureOf } from '#shared/notation/key-signature';
import { ticksOf, valuesOf, type NoteValue } from '#shared/notation/note-values';
import {
  newWords,
  ORDINARY_STATE,
  playingState,
  soundingWords,
  type PlayingState,
} from '#shared/notation/playing-words';
import { sectionLines } from '#shared/notation/section-lines';
import { staffChord, type StaffChord } from '#shared/notation/staff-chord';
import type { NotatedStudy } from '#shared/notation/system-plan';
import type { NoteNaming } from '#shared/pitch/display';
import type { Letter } from '#shared/pitch/names';
import type { Clef } from '#shared/strings/clefs';
import { SECTIONS, type Section } from '#shared/strings/sections';
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

/** One written length of a bar, the same in all five staves. */
export interface Moment {
  /** Null where a bar is filled up with rests. */
  readonly chordId: string | null;
  /** Place of the chord in the progression, from 1; at its beginning alone. */
  readonly begins: number | null;
  readonly name: string | null;
  readonly value: NoteValue;
  /** Tied to what came before, and to what follows. */
  readonly tiedFrom: boolean;
  readonly tiedTo: boolean;
  readonly staves: readonly StaffMoment[];
}

export interface Bar {
  /** From 1. */
  readonly number: number;
  /** The clefs with which it begins, from the top. */
  readonly clefs: readonly Clef[];
  /** Clefs of the next bar, where they differ: they are set before its bar line. */
  readonly clefsAfter: readonly (Clef | null)[];
  readonly moments: readonly Moment[];
  /** A rest of the whole bar, where nothing sounds in it. */
  readonly silent: boolean;
  readonly last: boolean;
}

export interface ScorePlan {
  readonly signature: number;
  readonly metre: NotatedStudy['metre'];
  readonly bars: readonly Bar[];
}

/** A stretch of one chord, or of rest, within one bar. */
interface Stretch {
  readonly chord: Chord | null;
  readonly place: number;
  readonly bar: number;
  readonly from: number;
  readonly ticks: number;
  readonly first: boolean;
  readonly final: boolean;
}

/** Ends are rounded, not lengths, so that lengths which no note can write do not add up to a drift. */
function stretchesOf(chords: readonly Chord[], { beats, unit }: NotatedStudy['metre']): readonly Stretch[] {
  const barTicks = ticksOf(beats, unit);
  const stretches: Stretch[] = [];
  let exact = 0;
  let at = 0;
  const add = (chord: Chord | null, place: number, end: number): void => {
    const start = at;
    while (at < end) {
      const bar = Math.floor(at / barTicks);
      const ticks = Math.min(end, (bar + 1) * barTicks) - at;
      const [first, final] = [at === start, at + ticks === end];
      stretches.push({ chord, place, bar, from: at - bar * barTicks, ticks, first, final });
      at += ticks;
    }
  };
  chords.forEach((chord, index) => {
    exact += ticksOf(chord.beats, unit);
    add(chord, index, Math.max(Math.round(exact), at + 1));
  });
  add(null, chords.length, Math.ceil(at / barTicks) * barTicks);
  return stretches;
}

/** One staff, read from left to right: what is in force is remembered from moment to moment. */
class StaffReader {
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

function momentsOf(stretch: Stretch, readers: readonly StaffReader[], beat: number): readonly Moment[] {
  const values = valuesOf(stretch.from, stretch.ticks, beat);
  return values.map((value, index) => {
    const begins = stretch.chord !== null && stretch.first && index === 0;
    return {
      chordId: stretch.chord?.id ?? null,
      begins: begins ? stretch.place + 1 : null,
      name: begins ? (stretch.chord?.name ?? null) : null,
      value,
      tiedFrom: stretch.chord !== null && !begins,
      tiedTo: stretch.chord !== null && !(stretch.final && index === values.length - 1),
      staves: readers.map((reader) => reader.read(stretch, index === 0)),
    };
  });
}

/**
 * Plans the whole progression as bars.
 * @param study key, metre and ensemble
 * @param chords in their order
 * @param naming how the reader names notes
 * @returns the bars; the last is filled up with rests
 * @example scorePlan(study, [a chord of 6 beats in 4/4], 'english').bars.length // 2
 */
export function scorePlan(study: NotatedStudy, chords: readonly Chord[], naming: NoteNaming): ScorePlan {
  const signature = signatureOf(study.key);
  const alterations = signatureAlterations(signature);
  const readers = SECTIONS.map((section) => new StaffReader(section, study, naming, alterations, chords));
  const beat = ticksOf(1, study.metre.unit);
  const byBar: Moment[][] = [];
  for (const stretch of stretchesOf(chords, study.metre)) {
    const moments = (byBar[stretch.bar] ??= []);
    moments.push(...momentsOf(stretch, readers, beat));
  }
  const clefsOf = (moments: readonly Moment[] | undefined): readonly Clef[] =>
    moments?.[0]?.staves.map(({ clef }) => clef) ?? [];
  const bars = byBar.map((moments, index) => {
    const ending = moments.at(-1)?.staves ?? [];
    const next = clefsOf(byBar[index + 1]);
    return {
      number: index + 1,
      clefs: clefsOf(moments),
      clefsAfter: ending.map(({ clef }, staff) => {
        const after = next[staff];
        return after === undefined || after === clef ? null : after;
      }),
      moments,
      silent: moments.every(({ staves }) => staves.every(({ chord }) => chord === null)),
      last: index === byBar.length - 1,
    };
  });
  return { signature, metre: study.metre, bars };
}
