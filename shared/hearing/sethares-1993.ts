import type { PureTone } from '#shared/hearing/partials';
import { sumOverPairs } from '#shared/hearing/partials';

/** The constants of the fitted dissonance curve. */
export interface SetharesConstants {
  readonly rise: number;
  readonly fall: number;
  readonly dStar: number;
  readonly slope: number;
  readonly offset: number;
}

/** @source Sethares 1993, JASA 94: as printed in the paper */
export const SETHARES_PAPER: SetharesConstants = {
  rise: 3.5,
  fall: 5.75,
  dStar: 0.24,
  slope: 0.021,
  offset: 19,
};
/** @source the constants of Sethares's own routine, published with the paper */
export const SETHARES_ROUTINE: SetharesConstants = {
  rise: 3.51,
  fall: 5.75,
  dStar: 0.24,
  slope: 0.0207,
  offset: 18.96,
};

/**
 * The dissonance curve of two tones of unit amplitude.
 * @param x scaled distance
 * @source e^(−3.5 x) − e^(−5.75 x)
 */
export function dissonanceCurve(x: number, { rise, fall }: SetharesConstants = SETHARES_PAPER): number {
  return Math.exp(-rise * x) - Math.exp(-fall * x);
}

/**
 * Roughness after Sethares; of two amplitudes the smaller counts.
 * @param partials the unit of amplitude scales the result
 * @param constants of the paper, unless others are given
 * @source Sethares 1993, JASA 94(3): Σ min(a_i, a_j)(e^(−3.5 sΔ) − e^(−5.75 sΔ)), s = 0.24 / (0.021 f + 19) with
 *   the lower frequency; the smaller amplitude in place of the paper's product as in his later work
 * @example sethares1993(harmonicPartials([60, 64, 67], 11, 'exact')) // 0.7735006
 */
export function sethares1993(
  partials: readonly PureTone[],
  constants: SetharesConstants = SETHARES_PAPER,
): number {
  return sumOverPairs(partials, (a, b) => {
    const scale = constants.dStar / (constants.slope * a.frequencyHz + constants.offset);
    const curve = dissonanceCurve(scale * (b.frequencyHz - a.frequencyHz), constants);
    return Math.min(a.amplitude, b.amplitude) * curve;
  });
}
