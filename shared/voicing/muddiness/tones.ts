import { erbAt } from '#shared/hearing/erb';
import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz, Midi } from '#shared/units';
import type { Partial } from '#shared/voicing/analysis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';

const DB_PER_AMPLITUDE_DECADE = 20;
/** The power that has a quick way of its own. */
const SQUARE_ROOT = 0.5;

/**
 * The shape of a voice's sound: its partials scaled so that the squares of their amplitudes add up to 1 at mf.
 * Playing louder adds to the top and takes nothing from the bottom.
 */
export interface Tone {
  /** Its partials, without the level of the voice that sounds it. */
  readonly partials: readonly Partial[];
  readonly fundamental: Midi;
  readonly frequencies: Float64Array;
  readonly amplitudes: Float64Array;
  /** The amplitudes at mf: whether partials fuse is a matter of pitch, not of how loud one plays. */
  readonly shape: Float64Array;
  /** Where the partials lie on the pitch axis. */
  readonly pitches: Float64Array;
}

/**
 * @param partials rising in frequency, at least one; their common level drops out
 * @param a4Hz places the tone on the pitch axis
 * @param atMf the same partials at mf, by which they are scaled
 */
export function toneOf(partials: readonly Partial[], a4Hz: Hertz, atMf: readonly Partial[] = partials): Tone {
  const frequencies = Float64Array.from(partials, ({ frequencyHz }) => frequencyHz);
  const atMfAmplitudes = Float64Array.from(atMf, amplitudeOf);
  const scale = 1 / Math.sqrt(atMfAmplitudes.reduce((sum, a) => sum + a * a, 0));
  return {
    partials,
    fundamental: midiOfFrequency(frequencies[0] ?? 0, a4Hz),
    frequencies,
    amplitudes: Float64Array.from(partials, (partial) => amplitudeOf(partial) * scale),
    shape: atMfAmplitudes.map((a) => a * scale),
    pitches: frequencies.map((frequency) => midiOfFrequency(frequency, a4Hz)),
  };
}

function amplitudeOf({ levelDb }: Partial): number {
  return 10 ** (levelDb / DB_PER_AMPLITUDE_DECADE);
}

/**
 * How much two partials cloud each other.
 * @param y their difference in equivalent rectangular bandwidths at their mean
 * @returns 0 … 1, 1 at the peak, 0 from the reach on
 * @source g(y) = ((y/p) exp(1 − y/p))^s, after the form of Parncutt's curve for Hutchinson & Knopoff 1978
 */
export function cloudingAt(y: number, { peakErb, sharpness, reachErb }: MuddinessConstants): number {
  if (y >= reachErb) return 0;
  const base = (y / peakErb) * Math.exp(1 - y / peakErb);
  return sharpness === SQUARE_ROOT ? Math.sqrt(base) : base ** sharpness;
}

/** @returns the difference of two frequencies in equivalent rectangular bandwidths at their mean */
export function distanceErb(a: Hertz, b: Hertz): number {
  return Math.abs(a - b) / erbAt((a + b) / 2);
}
