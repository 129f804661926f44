import type { PureTone } from '#shared/hearing/partials';
import { sumOverPairs } from '#shared/hearing/partials';
import type { SetharesConstants } from '#shared/hearing/sethares-1993';
import { dissonanceCurve, SETHARES_PAPER } from '#shared/hearing/sethares-1993';

const LEVEL_EXPONENT = 0.1;
const FLUCTUATION_EXPONENT = 3.11;
/** Vassilakis keeps Sethares's exponents and the finer slope of his routine. */
const CURVE: SetharesConstants = { ...SETHARES_PAPER, slope: 0.0207, offset: 18.96 };
/** The published sums run over ordered pairs: every pair twice. */
const ORDERED_PAIRS = 2;

/**
 * Roughness after Vassilakis, which weighs how deep two partials' beats are.
 * @param partials the unit of amplitude hardly matters (its tenth root does)
 * @source Vassilakis 2001, PhD UCLA, eq. 6.23: (a_i a_j)^0.1 · ½ (2 min / (a_i + a_j))^3.11 · curve, over ordered
 *   pairs
 * @example vassilakis2001(harmonicPartials([60, 64, 67], 11, 'exact')) // 2.083763
 */
export function vassilakis2001(partials: readonly PureTone[]): number {
  const unordered = sumOverPairs(partials, (a, b) => {
    const scale = CURVE.dStar / (CURVE.slope * a.frequencyHz + CURVE.offset);
    const depth = (2 * Math.min(a.amplitude, b.amplitude)) / (a.amplitude + b.amplitude);
    const level = (a.amplitude * b.amplitude) ** LEVEL_EXPONENT;
    const curve = dissonanceCurve(scale * (b.frequencyHz - a.frequencyHz), CURVE);
    return (level / 2) * depth ** FLUCTUATION_EXPONENT * curve;
  });
  return ORDERED_PAIRS * unordered;
}
