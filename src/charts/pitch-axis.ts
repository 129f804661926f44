import type { Midi } from '#shared/units';
import type { AxisView } from '@/charts/axis-view';

/** The one pitch axis of the bench: the same pitch at the same height in every pane. */
export interface PitchAxis {
  readonly low: Midi;
  readonly high: Midi;
  /** Height of the strip above the axis in which what lies over `high` is squeezed, in pixels. */
  readonly strip: number;
  /** Height of strip and axis together, in pixels. */
  readonly height: number;
  /** Height of a semitone, in pixels. */
  readonly semitone: number;
  /** Pixels from the top of the pane; what lies over the axis stands in its strip. */
  readonly yOf: (midi: Midi) => number;
  /** The nearest key of the keyboard, within the axis. */
  readonly midiAt: (y: number) => Midi;
  readonly octaves: readonly { readonly octave: number; readonly midi: Midi; readonly y: number }[];
}

/** Unless a note lies further out: B0, the lowest open string, to C7, with half a semitone round them. */
export const DEFAULT_SPAN = { low: 22.5, high: 96.5 } as const;
/** Room beyond a note that lies further out. */
const ROOM = 1.5;
/** 10 kHz, where the partials end, lies at 123.08. */
const STRIP_TOP: Midi = 123.5;
const OCTAVE = 12;

/** @returns the whole axis: the default span, and wherever a note lies further out */
export function wholeView(notes: readonly Midi[]): AxisView {
  return {
    low: Math.min(DEFAULT_SPAN.low, ...notes.map((midi) => midi - ROOM)),
    high: Math.max(DEFAULT_SPAN.high, ...notes.map((midi) => midi + ROOM)),
  };
}

/**
 * @param notes of the chord, in MIDI numbers: the axis makes room for the lowest and highest
 * @param height of strip and axis together, in pixels, more than the strip's
 * @param strip height of the strip above, in pixels
 * @param view what of the axis is shown; all of it unless given
 * @returns the axis
 * @example pitchAxis([], 500, 40).yOf(96.5) // 40
 */
export function pitchAxis(
  notes: readonly Midi[],
  height: number,
  strip: number,
  view: AxisView = wholeView(notes),
): PitchAxis {
  const { low, high } = view;
  const semitone = (height - strip) / (high - low);
  const squeezed = strip / Math.max(STRIP_TOP - high, 1);
  const yOf = (midi: Midi): number =>
    midi <= high ? strip + (high - midi) * semitone : Math.max(strip - (midi - high) * squeezed, 0);
  const midiAt = (y: number): Midi => {
    const midi = Math.round(high - (y - strip) / semitone);
    return Math.min(Math.max(midi, Math.ceil(low)), Math.floor(high));
  };
  const first = Math.ceil(low / OCTAVE);
  const last = Math.floor(high / OCTAVE);
  const octaves = Array.from({ length: last - first + 1 }, (_, index) => {
    const midi = (first + index) * OCTAVE;
    return { octave: first + index - 1, midi, y: yOf(midi) };
  });
  return { low, high, strip, height, semitone, yOf, midiAt, octaves };
}
