import { amplitudeOf } from '@/audio/levels';
import type { Partial } from '#shared/voicing/analysis';
import type { Hertz } from '#shared/units';

/** Partials that are exact multiples of one frequency, as the cosine and sine terms of a periodic wave. */
export interface Wave {
  readonly fundamentalHz: Hertz;
  /** Cosine terms, index n for the nth multiple; index 0 is silent. */
  readonly real: Float32Array<ArrayBuffer>;
  /** Sine terms. */
  readonly imag: Float32Array<ArrayBuffer>;
}

/** Partials nearer to their multiple than this are of one series: a fiftieth of a cent. */
const SAME_SERIES = 1e-5;
/** Irrational steps, so that no two partials and no two voices stand in a simple relation of phase. */
const PHASE_STEP = Math.SQRT2 - 1;
const VOICE_STEP = (Math.sqrt(5) - 1) / 2;

/** Phases that grow with the square of n spread the peaks over the period: little headroom is lost. */
function phaseOf(n: number, seed: number): number {
  return 2 * Math.PI * ((PHASE_STEP * n * n + VOICE_STEP * n * seed) % 1);
}

function inOneSeries(a: Partial, b: Partial): boolean {
  const base = b.frequencyHz / b.n;
  return Math.abs(a.frequencyHz / a.n - base) < SAME_SERIES * base;
}

/** Which wave of a voice: the middle's, or the one a quarter of a period from it in every partial. */
export type WaveKind = 'middle' | 'others';

const QUARTER_TURN = Math.PI / 2;

/** The others stand before or behind the middle, from partial to partial in no simple order. */
function turnOf(n: number, seed: number, kind: WaveKind): number {
  if (kind === 'middle') return 0;
  return Math.cos(phaseOf(n, seed + 1)) < 0 ? -QUARTER_TURN : QUARTER_TURN;
}

function waveOf(series: readonly Partial[], fundamentalHz: Hertz, seed: number, kind: WaveKind): Wave {
  const length = series.reduce((most, { n }) => Math.max(most, n), 0) + 1;
  const wave = { fundamentalHz, real: new Float32Array(length), imag: new Float32Array(length) };
  for (const { n, levelDb } of series) {
    const amplitude = amplitudeOf(levelDb);
    const phase = phaseOf(n, seed) + turnOf(n, seed, kind);
    wave.real[n] = amplitude * Math.cos(phase);
    wave.imag[n] = amplitude * Math.sin(phase);
  }
  return wave;
}

/**
 * The waves that together are exactly the given partials. A bowed string's partials are one harmonic series
 * and make one wave, one oscillator; a partial that is no exact multiple gets a wave of its own, so that any
 * list of partials sounds as it stands.
 * @param partials n ≥ 1, frequencies in hertz > 0
 * @param seed any whole number ≥ 0; voices with different ones are not in phase
 * @param kind whose wave: the middle's, or that of the others in the section
 * @returns one wave for each harmonic series among the partials; amplitudes against 0 dB
 * @example wavesOf([{ n: 1, frequencyHz: 100, levelDb: 0 }, { n: 2, frequencyHz: 201, levelDb: 0 }], 0).length // 2
 */
export function wavesOf(
  partials: readonly Partial[],
  seed: number,
  kind: WaveKind = 'middle',
): readonly Wave[] {
  const series: Partial[][] = [];
  for (const partial of partials) {
    const known = series.find(([first]) => first && inOneSeries(partial, first));
    if (known) known.push(partial);
    else series.push([partial]);
  }
  return series.flatMap((members) => {
    const [first] = members;
    return first ? [waveOf(members, first.frequencyHz / first.n, seed, kind)] : [];
  });
}

/**
 * @param id of a voice
 * @returns a whole number for {@link wavesOf}, the same for the same id
 * @example seedOf('AB') // 65 * 31 + 66
 */
export function seedOf(id: string): number {
  const BASE = 31;
  const BOUND = 1_000_003;
  return [...id].reduce((sum, letter) => (sum * BASE + letter.charCodeAt(0)) % BOUND, 0);
}
