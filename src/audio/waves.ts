import { amplitudeOf } from '@/audio/levels';
import { SECTIONS, type Section } from '#shared/strings/sections';
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
/** An irrational step, so that no two partials stand in a simple relation of phase. */
const PHASE_STEP = Math.SQRT2 - 1;
const SIGN_STEP = (Math.sqrt(5) - 1) / 2;

/** Phases that grow with the square of n spread the peaks over the period: little headroom is lost. */
function phaseOf(n: number): number {
  return 2 * Math.PI * ((PHASE_STEP * n * n) % 1);
}

function inOneSeries(a: Partial, b: Partial): boolean {
  const base = b.frequencyHz / b.n;
  return Math.abs(a.frequencyHz / a.n - base) < SAME_SERIES * base;
}

/** Which wave of a voice: the middle's, or the one a quarter of a period from it in every partial. */
export type WaveKind = 'middle' | 'others';

const QUARTER_TURN = Math.PI / 2;

/** The others stand before or behind the middle, from partial to partial in no simple order. */
function turnOf(n: number, kind: WaveKind): number {
  if (kind === 'middle') return 0;
  return (SIGN_STEP * n) % 1 < 1 / 2 ? -QUARTER_TURN : QUARTER_TURN;
}

function waveOf(series: readonly Partial[], fundamentalHz: Hertz, turned: boolean, kind: WaveKind): Wave {
  const length = series.reduce((most, { n }) => Math.max(most, n), 0) + 1;
  const wave = { fundamentalHz, real: new Float32Array(length), imag: new Float32Array(length) };
  for (const { n, levelDb } of series) {
    const amplitude = amplitudeOf(levelDb);
    const phase = phaseOf(n) + turnOf(n, kind) + (turned ? QUARTER_TURN : 0);
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
 * @param turned a quarter of a period later in every partial: two voices in unison of which one is turned add
 *   their energies, neither strengthening nor extinguishing each other
 * @param kind whose wave: the middle's, or that of the others in the section
 * @returns one wave for each harmonic series among the partials; amplitudes against 0 dB
 * @example wavesOf([{ n: 1, frequencyHz: 100, levelDb: 0 }, { n: 2, frequencyHz: 201, levelDb: 0 }], false).length // 2
 */
export function wavesOf(
  partials: readonly Partial[],
  turned: boolean,
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
    return first ? [waveOf(members, first.frequencyHz / first.n, turned, kind)] : [];
  });
}

/**
 * Whether a section's waves are turned by a quarter: neighbours in the score, who double each other most, never
 * stand alike.
 * @example isTurned('viola') !== isTurned('cello') // true
 */
export function isTurned(section: Section): boolean {
  return SECTIONS.indexOf(section) % 2 === 1;
}
