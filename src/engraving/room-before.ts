import type { StaffChord } from '#shared/notation/staff-chord';
import { stepOf } from '#shared/notation/written-notes';

/** A sixth apart, two accidentals may stand over each other; common practice. */
const STACKED_STEPS = 6;
const COLUMN = 11;
const DOUBLE_COLUMN = 15;
const STOP_BRACKET = 9;
/** A head of a second, set to the other side of the stem. */
const DISPLACED = 12;

/**
 * The room that accidentals, double-stop brackets and heads set aside need left of a chord's heads.
 * @param chord null is a rest
 * @returns tenths of a staff space
 * @example accidentalRoom(null) // 0
 */
export function accidentalRoom(chord: StaffChord | null): number {
  if (!chord) return 0;
  const columns: number[] = [];
  for (const { accidental, pitch } of chord.notes) {
    if (accidental === null) continue;
    const step = stepOf(pitch);
    const free = columns.findIndex((top) => step - top >= STACKED_STEPS);
    columns[free < 0 ? columns.length : free] = step;
  }
  const doubled = chord.notes.some(({ accidental }) => Math.abs(accidental ?? 0) > 1);
  const steps = chord.notes.map(({ pitch }) => stepOf(pitch));
  const seconds = steps.some((step, index) => index > 0 && step - (steps[index - 1] ?? step) <= 1);
  const stops = chord.stops.length > 0 ? STOP_BRACKET : 0;
  return columns.length * (doubled ? DOUBLE_COLUMN : COLUMN) + stops + (seconds ? DISPLACED : 0);
}
