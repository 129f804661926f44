import type { Hertz } from '#shared/units';

/**
 * Unmeasured tremolo: about nine strokes a second, each player a little faster or slower than the next.
 * @source order of magnitude from memory: eight to twelve strokes a second
 */
const STROKES_PER_SECOND: Hertz = 9;
/** Strokes of two players drift apart by this part of their rate. Chosen. */
const RATE_SPREAD = 0.06;
/** A stroke's level over its time as a constant and cosines: quick to grip, falling to about a quarter. */
const STROKE_TERMS = [1, 0.5, 0.16] as const;
/** How far each cosine comes after the beginning of the stroke, in turns: the level stands highest early in it. */
const STROKE_PEAK = 0.18;

/** A tremolo as a constant level and a periodic part round it; their joint energy is 1. */
export interface Strokes {
  readonly ratesHz: readonly Hertz[];
  /** The level about which the strokes swing. */
  readonly base: number;
  /** Cosine and sine terms of the swing, index n for the nth multiple of the rate. */
  readonly real: readonly number[];
  readonly imag: readonly number[];
}

/**
 * Restarted strokes for each player of a voice, scaled so that the mean energy of a partial stays as plotted.
 * @param players how many stroke by themselves, ≥ 1
 * @returns one rate a player
 * @example strokesFor(1).ratesHz.length // 1
 */
export function strokesFor(players: number): Strokes {
  const energy = STROKE_TERMS.reduce<number>(
    (sum, term, n) => sum + (n === 0 ? term ** 2 : term ** 2 / 2),
    0,
  );
  const terms = STROKE_TERMS.map((term) => term / Math.sqrt(energy));
  const phase = (n: number) => 2 * Math.PI * n * STROKE_PEAK;
  return {
    ratesHz: Array.from(
      { length: players },
      (_, index) => STROKES_PER_SECOND * (1 + RATE_SPREAD * (((index * (Math.SQRT2 - 1)) % 1) - 1 / 2)),
    ),
    base: terms[0] ?? 0,
    real: terms.map((term, n) => (n === 0 ? 0 : term * Math.cos(phase(n)))),
    imag: terms.map((term, n) => (n === 0 ? 0 : term * Math.sin(phase(n)))),
  };
}
