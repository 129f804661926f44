import type { Midi, Semitones } from '#shared/units';

/** What of the pitch axis is shown, in MIDI numbers. */
export interface AxisView {
  readonly low: Midi;
  readonly high: Midi;
}

/** Closer than an octave nothing is gained. */
export const LEAST_SPAN: Semitones = 12;
/** Round the notes of a chord: their tokens, and the partials that cloud just over them. */
const ROOM_BELOW: Semitones = 2.5;
const ROOM_ABOVE: Semitones = 7.5;

/**
 * Zooms about a pitch that stays where it is.
 * @param view what is shown
 * @param factor over 1 comes closer, under 1 goes away
 * @param at the pitch that stays
 * @param whole the view is never wider
 * @example zoomView({ low: 20, high: 100 }, 2, 60, { low: 20, high: 100 }) // { low: 40, high: 80 }
 */
export function zoomView(view: AxisView, factor: number, at: Midi, whole: AxisView): AxisView {
  const span = view.high - view.low;
  const wanted = Math.min(Math.max(span / factor, LEAST_SPAN), whole.high - whole.low);
  const low = at - ((at - view.low) * wanted) / span;
  return within({ low, high: low + wanted }, whole);
}

/**
 * Moves the view along the axis, as far as the whole reaches.
 * @param semitones up, or down where negative
 * @example panView({ low: 40, high: 60 }, 12, { low: 20, high: 100 }) // { low: 52, high: 72 }
 */
export function panView(view: AxisView, semitones: Semitones, whole: AxisView): AxisView {
  return within({ low: view.low + semitones, high: view.high + semitones }, whole);
}

/**
 * The view that shows all notes of a chord and not much else.
 * @param notes of the chord
 * @returns the whole where there are none
 * @example fitView([36, 60], { low: 20, high: 100 }) // { low: 33.5, high: 67.5 }
 */
export function fitView(notes: readonly Midi[], whole: AxisView): AxisView {
  if (notes.length === 0) return whole;
  const [lowest, highest] = [Math.min(...notes), Math.max(...notes)];
  const view = { low: lowest - ROOM_BELOW, high: highest + ROOM_ABOVE };
  const short = Math.max(LEAST_SPAN - (view.high - view.low), 0);
  return within({ low: view.low - short / 2, high: view.high + short / 2 }, whole);
}

/** @returns the view, moved no further than it must be to show a note */
export function showNote(view: AxisView, midi: Midi, whole: AxisView): AxisView {
  if (midi - ROOM_BELOW < view.low) return panView(view, midi - ROOM_BELOW - view.low, whole);
  if (midi + ROOM_BELOW > view.high) return panView(view, midi + ROOM_BELOW - view.high, whole);
  return view;
}

/** @returns whether less than the whole is shown */
export function isZoomed(view: AxisView, whole: AxisView): boolean {
  return view.low > whole.low || view.high < whole.high;
}

function within({ low, high }: AxisView, whole: AxisView): AxisView {
  const span = Math.min(high - low, whole.high - whole.low);
  const bottom = Math.min(Math.max(low, whole.low), whole.high - span);
  return { low: bottom, high: bottom + span };
}
