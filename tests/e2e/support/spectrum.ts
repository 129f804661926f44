import type { Recording } from './recording';

/** A spectral line: an amplitude of 1 is 0 dB. */
export interface Line {
  readonly frequencyHz: number;
  readonly levelDb: number;
}

/**
 * Four-term Blackman–Harris window: a line's skirts lie 92 dB under it, so that weak lines beside strong ones
 * are seen, and its main lobe is eight bins wide.
 * @source F. J. Harris, "On the use of windows for harmonic analysis with the discrete Fourier transform", 1978
 */
const BLACKMAN_HARRIS = [0.35875, -0.48829, 0.14128, -0.01168] as const;
const LOBE_BINS = 4;
const FLOOR_DB = -200;

function windowAt(index: number, size: number): number {
  const angle = (2 * Math.PI * index) / size;
  return BLACKMAN_HARRIS.reduce((sum, term, k) => sum + term * Math.cos(k * angle), 0);
}

/** In-place radix-2 fast Fourier transform (Cooley & Tukey 1965); the size is a power of 2. */
export function fft(real: Float64Array, imag: Float64Array): void {
  reverseBits(real, imag);
  for (let half = 1; half < real.length; half *= 2) {
    for (let offset = 0; offset < half; offset += 1) {
      const cos = Math.cos((Math.PI * offset) / half);
      const sin = -Math.sin((Math.PI * offset) / half);
      for (let a = offset; a < real.length; a += 2 * half) butterfly(real, imag, a, a + half, cos, sin);
    }
  }
}

function reverseBits(real: Float64Array, imag: Float64Array): void {
  for (let index = 1, mirrored = 0; index < real.length; index += 1) {
    let bit = real.length >> 1;
    for (; mirrored & bit; bit >>= 1) mirrored ^= bit;
    mirrored ^= bit;
    if (index < mirrored) {
      for (const part of [real, imag]) {
        const kept = part[index] ?? 0;
        part[index] = part[mirrored] ?? 0;
        part[mirrored] = kept;
      }
    }
  }
}

function butterfly(
  real: Float64Array,
  imag: Float64Array,
  a: number,
  b: number,
  cos: number,
  sin: number,
): void {
  const [realA, imagA] = [real[a] ?? 0, imag[a] ?? 0];
  const turnedReal = (real[b] ?? 0) * cos - (imag[b] ?? 0) * sin;
  const turnedImag = (real[b] ?? 0) * sin + (imag[b] ?? 0) * cos;
  real[a] = realA + turnedReal;
  imag[a] = imagA + turnedImag;
  real[b] = realA - turnedReal;
  imag[b] = imagA - turnedImag;
}

/** Energies by bin, of the longest power of 2 that the samples hold; a line of amplitude 1 has 1. */
function energiesOf(samples: Float32Array): Float64Array {
  const size = 2 ** Math.floor(Math.log2(samples.length));
  const real = Float64Array.from(
    { length: size },
    (_, index) => (samples[index] ?? 0) * windowAt(index, size),
  );
  const imag = new Float64Array(size);
  fft(real, imag);
  const lineGain = (BLACKMAN_HARRIS[0] * size) / 2;
  return Float64Array.from(
    { length: size / 2 },
    (_, bin) => ((real[bin] ?? 0) ** 2 + (imag[bin] ?? 0) ** 2) / lineGain ** 2,
  );
}

/** A line's exact place and height: the vertex of a parabola through the top three bins. */
function vertex(spectrum: Float64Array, bin: number, binHz: number): Line {
  const [before, top, after] = [spectrum[bin - 1] ?? 0, spectrum[bin] ?? 0, spectrum[bin + 1] ?? 0];
  const shift = (before - after) / (2 * (before - 2 * top + after));
  return { frequencyHz: (bin + shift) * binHz, levelDb: top - ((before - after) * shift) / 4 };
}

/** Silence is flat and has no top. */
function isTop(spectrum: Float64Array, bin: number): boolean {
  const top = spectrum[bin] ?? 0;
  for (let away = 1; away <= LOBE_BINS; away += 1) {
    if ((spectrum[bin - away] ?? 0) > top || (spectrum[bin + away] ?? 0) >= top) return false;
  }
  return true;
}

/**
 * All lines of a recording, both channels' energies together, so that it does not matter where a section sits.
 * @returns the strongest first; nothing within a line's own lobe counts as another
 */
export function linesOf({ left, right, sampleRate }: Recording): readonly Line[] {
  const [leftEnergies, rightEnergies] = [energiesOf(left), energiesOf(right)];
  const spectrum = leftEnergies.map((energy, bin) =>
    Math.max(10 * Math.log10(energy + (rightEnergies[bin] ?? 0)), FLOOR_DB),
  );
  const binHz = sampleRate / (2 * spectrum.length);
  const lines: Line[] = [];
  for (let bin = LOBE_BINS; bin < spectrum.length - LOBE_BINS; bin += 1) {
    if (isTop(spectrum, bin)) lines.push(vertex(spectrum, bin, binHz));
  }
  return lines.sort((a, b) => b.levelDb - a.levelDb);
}

/** @returns the largest sample of both channels */
export function peakOf({ left, right }: Pick<Recording, 'left' | 'right'>): number {
  const largest = (samples: Float32Array) => samples.reduce((most, x) => Math.max(most, Math.abs(x)), 0);
  return Math.max(largest(left), largest(right));
}

/** Weights of the eighth difference: a high-pass under which a crack stands out from a tone. */
const EIGHTH_DIFFERENCE = [1, -8, 28, -56, 70, -56, 28, -8, 1] as const;
/** The eighth difference of a step of 1: the largest sum of the weights up to one place. */
const OF_A_STEP = 35;

/**
 * The largest break of a recording: the height of the step that would stand out as far as its roughest moment
 * does. Tones without a break leave a little too, the more the higher they are.
 */
export function largestBreak({ left, right }: Pick<Recording, 'left' | 'right'>): number {
  const roughness = (samples: Float32Array, index: number) =>
    Math.abs(EIGHTH_DIFFERENCE.reduce((sum, weight, back) => sum + weight * (samples[index - back] ?? 0), 0));
  const roughest = (samples: Float32Array) =>
    samples.reduce(
      (most, _, index) =>
        index < EIGHTH_DIFFERENCE.length ? most : Math.max(most, roughness(samples, index)),
      0,
    );
  return Math.max(roughest(left), roughest(right)) / OF_A_STEP;
}
