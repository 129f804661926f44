import { MIDDLE_STEPS } from '#shared/notation/staff-chord';
import { sectionLines } from '#shared/notation/section-lines';
import { stepOf, writtenNotes } from '#shared/notation/written-notes';
import { midiOfName } from '#shared/pitch/names';
import { clefOf, type Clef } from '#shared/strings/clefs';
import type { BassKind, Section } from '#shared/strings/sections';
import type { Chord } from '#shared/study/study.document';

/** Steps from the middle line to the third ledger line: a single chord within them needs no clef of its own. */
const THIRD_LEDGER = 10;

interface Passage {
  readonly own: Clef;
  readonly steps: readonly number[];
}

function fits({ steps }: Passage, clef: Clef): boolean {
  return steps.every((step) => Math.abs(step - MIDDLE_STEPS[clef]) <= THIRD_LEDGER);
}

function passageOf(chord: Chord, section: Section, bass: BassKind): Passage | null {
  const voices = sectionLines(chord.voices, section).flat();
  if (voices.length === 0) return null;
  const own = clefOf(
    section,
    voices.map(({ pitch }) => midiOfName(pitch)),
  );
  const heads = voices.flatMap((voice) => writtenNotes(voice, bass));
  return { own, steps: heads.map(({ pitch }) => stepOf(pitch)) };
}

/**
 * The clef of each chord of a section's part. A rest keeps the clef; one chord alone does too where it stays
 * within three ledger lines of it, so that the clef changes for a passage and not for a note.
 * @returns one clef a chord
 * @source common practice
 * @example clefRuns([chord with the cello at C5, the same again], 'cello', 'four-string') // treble, treble
 */
export function clefRuns(chords: readonly Chord[], section: Section, bass: BassKind): readonly Clef[] {
  const passages = chords.map((chord) => passageOf(chord, section, bass));
  const sounding = passages.filter((passage) => passage !== null);
  let current = sounding[0]?.own ?? clefOf(section, []);
  let place = 0;
  return passages.map((passage) => {
    if (!passage) return current;
    const next = sounding[place + 1];
    place += 1;
    const lasts = next === undefined || next.own === passage.own;
    if (passage.own !== current && (lasts || !fits(passage, current))) current = passage.own;
    return current;
  });
}
