import type { Midi } from '#shared/units';
import type { PitchAxis } from '#shared/voicing/muddiness/axis';
import { AXIS_LOW, pitchAt } from '#shared/voicing/muddiness/axis';
import type { Register } from '#shared/voicing/registers';
import { REGISTER_BOUNDS } from '#shared/voicing/registers';

const FULL = 100;

/** The cloudiest place of a register. */
export interface RegisterPeak {
  readonly register: Register;
  /** ρ there. */
  readonly density: number;
  readonly point: number;
  readonly at: Midi;
}

/**
 * The index of a clouding density.
 * @returns 0 … 100; 50 where the density is the threshold
 * @source 100 · (1 − 2^(−ρ / T))
 * @example indexOf(0.2, 0.2) // 50
 */
export function indexOf(density: number, threshold: number): number {
  return FULL * (1 - 2 ** (-density / threshold));
}

/** @returns the cloudiest place of each register, low to high; its edges belong to both neighbours */
export function registerPeaks(density: Float64Array, axis: PitchAxis): readonly RegisterPeak[] {
  return REGISTER_BOUNDS.map(({ register, low, high }) => {
    const first = Math.round((low - AXIS_LOW) / axis.step);
    const last = Math.round((high - AXIS_LOW) / axis.step);
    let point = first;
    for (let x = first; x <= last; x += 1) if ((density[x] ?? 0) > (density[point] ?? 0)) point = x;
    return { register, density: density[point] ?? 0, point, at: pitchAt(axis, point) };
  });
}

/**
 * @returns the register with the highest peak; null where nothing clouds
 * @example cloudiestOf([]) // null
 */
export function cloudiestOf(peaks: readonly RegisterPeak[]): RegisterPeak | null {
  return peaks.reduce<RegisterPeak | null>(
    (best, peak) => (peak.density > (best?.density ?? 0) ? peak : best),
    null,
  );
}

/** The highest index that is told from 100: beyond it ρ is over fifty times the threshold. */
const HIGHEST_INDEX = 100 - 1e-13;

/**
 * @returns ρ of an index, the inverse of {@link indexOf}
 * @example densityOfIndex(50, 0.2) // 0.2
 */
export function densityOfIndex(index: number, threshold: number): number {
  return -threshold * Math.log2(1 - Math.min(index, HIGHEST_INDEX) / FULL);
}
