import { MIDDLE_STEPS, type StaffChord } from '#shared/notation/staff-chord';
import { stepOf } from '#shared/notation/written-notes';
import type { Clef } from '#shared/strings/clefs';
import { SPACE, STAFF_HEIGHT, STEP } from '@/engraving/units';

/** What of a staff at one moment takes room. */
export interface StaffContent {
  readonly clef: Clef;
  readonly chord: StaffChord | null;
  readonly words: readonly string[];
  readonly dynamics: readonly unknown[];
}

export interface ChordShape {
  /** Heights of the highest and lowest head's middle, downwards from the top line. */
  readonly top: number;
  readonly bottom: number;
  readonly stemUp: boolean;
}

/** A stem is an octave long; common practice. */
const STEM = 3.5 * SPACE;
const HALF_HEAD = STEP;
/** The ordinary clefs reach over and under their staff by this much. */
const CLEF_OVER = 1.6 * SPACE;
const CLEF_UNDER = 1.2 * SPACE;
export const CIRCLE_ROOM = SPACE;
export const OCTAVE_SIGN_ROOM = 1.8 * SPACE;
const DYNAMIC_ROOM = 2.4 * SPACE;
const AIR = 0.6 * SPACE;
/** A line of words in parts of its letters' size. */
export const LINE = 1.15;

/** An accidental reaches over the middle of its head by this much; a flat by more. */
const ACCIDENTAL_OVER = 1.5 * SPACE;
const FLAT_OVER = 1.9 * SPACE;

function accidentalsOver(chord: StaffChord): number {
  const { accidental } = chord.notes.at(-1) ?? { accidental: null };
  if (accidental === null) return 0;
  return accidental < 0 ? FLAT_OVER : ACCIDENTAL_OVER;
}

/** @returns where the heads of a chord lie, and which way its stem goes */
export function chordShape(chord: StaffChord, clef: Clef): ChordShape {
  const steps = chord.notes.map(({ pitch }) => stepOf(pitch));
  const middle = MIDDLE_STEPS[clef];
  const yOf = (step: number): number => STAFF_HEIGHT / 2 + (middle - step) * STEP;
  const [low, high] = [Math.min(...steps), Math.max(...steps)];
  return { top: yOf(high), bottom: yOf(low), stemUp: (low + high) / 2 < middle };
}

/**
 * Where the words over a chord stand: over heads, stem, circles and the staff.
 * @param stemmed whether its note values have stems
 * @returns the lowest line's foot, and the room over the top line that is taken below it
 */
export function topOf({ clef, chord }: StaffContent, stemmed: boolean): number {
  if (!chord) return 0;
  const { top, stemUp } = chordShape(chord, clef);
  const stem = Math.max(stemUp && stemmed ? STEM : HALF_HEAD, accidentalsOver(chord));
  const circles = chord.notes.filter(({ circled }) => circled).length;
  const signs = circles * CIRCLE_ROOM + (chord.octaveUp ? OCTAVE_SIGN_ROOM : 0);
  return Math.min(top - stem - signs, 0);
}

/** @returns the lowest that a chord reaches, at least the bottom line */
export function bottomOf({ clef, chord }: StaffContent, stemmed: boolean): number {
  if (!chord) return STAFF_HEIGHT;
  const { bottom, stemUp } = chordShape(chord, clef);
  return Math.max(bottom + (!stemUp && stemmed ? STEM : HALF_HEAD), STAFF_HEIGHT);
}

export interface Extents {
  /** Room over the top line and under the bottom line. */
  readonly above: number;
  readonly below: number;
}

/**
 * The room that a staff needs over and under its lines.
 * @param moments what stands on it
 * @param line height of a line of words
 * @example staffExtents([], true, 12) // the clef's own room
 */
export function staffExtents(moments: readonly StaffContent[], stemmed: boolean, line: number): Extents {
  let above = CLEF_OVER;
  let below = CLEF_UNDER;
  for (const moment of moments) {
    const words = moment.words.length * line;
    above = Math.max(above, -topOf(moment, stemmed) + words + AIR);
    const dynamic = moment.dynamics.length > 0 ? DYNAMIC_ROOM : 0;
    below = Math.max(below, bottomOf(moment, stemmed) - STAFF_HEIGHT + dynamic + AIR);
  }
  return { above, below };
}
