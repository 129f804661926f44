import type { Hertz, Semitones } from '#shared/units';

/** The constants of the muddiness index; those in force are in shared/data/muddiness-constants. */
export interface MuddinessConstants {
  /** p: the difference, in equivalent rectangular bandwidths, at which two partials cloud most. */
  readonly peakErb: number;
  /** s: how sharply the clouding falls away from there. */
  readonly sharpness: number;
  /** Beyond this many equivalent rectangular bandwidths two partials no longer cloud each other. */
  readonly reachErb: number;
  /** c: within about this many bandwidths partials fuse instead of beating. */
  readonly fusionErb: number;
  /** κ: how much fusing partials clear a pair of voices. */
  readonly fusionStrength: number;
  /** m: 1 adds all pairs of voices, more lets the cloudiest govern. */
  readonly pooling: number;
  /** ε: how much the voices around count for what sounds at the place. */
  readonly floor: number;
  /** f_c: from here up the same roughness is harsh rather than muddy. */
  readonly cornerHz: Hertz;
  /** q: how fast it turns. */
  readonly slope: number;
  /** Width of the smooth window over the clouding. */
  readonly windowSemitones: Semitones;
  /** Width of the smooth window over what sounds at the place. */
  readonly localWindowSemitones: Semitones;
  /** T: the clouding that scores 50. */
  readonly threshold: number;
}

/**
 * @returns x^m as a function of x ≥ 0; a square has a quicker way of its own
 * @example poolingPower({ pooling: 2 })(3) // 9
 */
export function poolingPower({ pooling }: Pick<MuddinessConstants, 'pooling'>): (x: number) => number {
  return pooling === 2 ? (x) => x * x : (x) => x ** pooling;
}
