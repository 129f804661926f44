import { erbAt } from '#shared/hearing/erb';
import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz, Midi } from '#shared/units';
import type { Partial } from '#shared/voicing/analysis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';

const DB_PER_AMPLITUDE_DECADE = 20;
const DB_PER_POWER_DECADE = 10;
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
  /** Weights of the same partials in an ideal series, 1/n, their squares adding up to 1: by these tones fuse. */
  readonly series: Float64Array;
  /** Where the partials lie on the pitch axis. */
  readonly pitches: Float64Array;
}

/**
 * @param partials rising in frequency, at least one; their common level drops out
 * @param a4Hz places the tone on the pitch axis
 * @param atMf the same partials at mf, by which they are scaled
 * @example toneOf(partials, 440).series[1] // half of the first: 1/n
 */
export function toneOf(partials: readonly Partial[], a4Hz: Hertz, atMf: readonly Partial[] = partials): Tone {
  const { length } = partials;
  const tone = {
    partials,
    fundamental: midiOfFrequency(partials[0]?.frequencyHz ?? 0, a4Hz),
    frequencies: new Float64Array(length),
    amplitudes: new Float64Array(length),
    series: new Float64Array(length),
    pitches: new Float64Array(length),
  };
  const scale = 1 / Math.sqrt(sumOf(atMf, energyOf));
  const seriesScale = 1 / Math.sqrt(sumOf(partials, seriesEnergy));
  for (let i = 0; i < length; i += 1) {
    const partial = partials[i];
    if (!partial) break;
    tone.frequencies[i] = partial.frequencyHz;
    tone.amplitudes[i] = scale * 10 ** (partial.levelDb / DB_PER_AMPLITUDE_DECADE);
    tone.series[i] = seriesScale / partial.n;
    tone.pitches[i] = midiOfFrequency(partial.frequencyHz, a4Hz);
  }
  return tone;
}

function sumOf(partials: readonly Partial[], part: (partial: Partial) => number): number {
  let sum = 0;
  for (const partial of partials) sum += part(partial);
  return sum;
}

function energyOf({ levelDb }: Partial): number {
  return 10 ** (levelDb / DB_PER_POWER_DECADE);
}

/**
 * Whether two notes fuse is a matter of their pitches: how loud a body lets single partials through makes a fifth
 * no less a fifth.
 * @source Helmholtz 1863: 1/n, the force of ideal stick-slip motion; that fusion goes by it is this index's own
 */
function seriesEnergy({ n }: Partial): number {
  return 1 / n ** 2;
}

/**
 * How much two partials cloud each other.
 * @param y their difference in equivalent rectangular bandwidths at their mean
 * @returns 0 … 1, 1 at the peak, 0 from the reach on
 * @source g(y) = ((y/p) exp(1 − y/p))^s, after the form of Parncutt's curve for Hutchinson & Knopoff 1978
 * @example cloudingAt(constants.peakErb, constants) // 1
 */
export function cloudingAt(y: number, { peakErb, sharpness, reachErb }: MuddinessConstants): number {
  if (y >= reachErb) return 0;
  const base = (y / peakErb) * Math.exp(1 - y / peakErb);
  return sharpness === SQUARE_ROOT ? Math.sqrt(base) : base ** sharpness;
}

/**
 * @returns the difference of two frequencies in equivalent rectangular bandwidths at their mean
 * @example distanceErb(1000, 1000) // 0
 */
export function distanceErb(a: Hertz, b: Hertz): number {
  return Math.abs(a - b) / erbAt((a + b) / 2);
}
