import { signatureAlterations, signatureOf } from '#shared/notation/key-signature';
import { ticksOf, valuesOf, type NoteValue } from '#shared/notation/note-values';
import { StaffReader, type StaffMoment } from '#shared/notation/staff-reader';
import { stretchesOf, type Stretch } from '#shared/notation/stretches';
import type { NotatedStudy } from '#shared/notation/system-plan';
import type { NoteNaming } from '#shared/pitch/display';
import type { Clef } from '#shared/strings/clefs';
import { SECTIONS } from '#shared/strings/sections';
import type { Chord } from '#shared/study/study.document';

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
