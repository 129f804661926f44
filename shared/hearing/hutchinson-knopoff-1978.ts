import type { PureTone } from '#shared/hearing/partials';
import { sumOverPairs } from '#shared/hearing/partials';
import type { Hertz } from '#shared/units';

const BANDWIDTH_SCALE = 1.72;
const BANDWIDTH_EXPONENT = 0.65;
const PEAK = 0.25;
const CUT_OFF = 1.2;

/**
 * The critical bandwidth of Hutchinson & Knopoff between two tones.
 * @returns hertz
 * @source Hutchinson & Knopoff 1978: 1.72 f̄^0.65
 * @example criticalBandwidth(400, 440) // 87.225
 */
export function criticalBandwidth(lowerHz: Hertz, upperHz: Hertz): Hertz {
  return BANDWIDTH_SCALE * ((lowerHz + upperHz) / 2) ** BANDWIDTH_EXPONENT;
}

/**
 * How rough two tones are at a distance.
 * @param y their distance in critical bandwidths
 * @param cutOff beyond this they are not rough at all; none if infinite
 * @source Parncutt's analytic curve ((y/0.25) e^(1 − y/0.25))², cut off at 1.2
 * @example pairWeight(1) // 0.0397
 */
export function pairWeight(y: number, cutOff: number = CUT_OFF): number {
  return y > cutOff ? 0 : ((y / PEAK) * Math.exp(1 - y / PEAK)) ** 2;
}

/**
 * Roughness after Hutchinson & Knopoff in Parncutt's analytic form. Whether partials lie exactly or on the
 * nearest keys, and how many there are, is the variant: it is decided where the partials are made.
 * @param partials the unit of amplitude drops out
 * @returns 0 or more; 0 for no partials
 * @source Hutchinson & Knopoff 1978, Interface 7: Σ a_i a_j g / Σ a_i²; analytic form Bigand, Parncutt &
 *   Lerdahl 1996; Harrison & Pearce 2020
 * @example hutchinsonKnopoff1978(harmonicPartials([60, 64, 67], 11, 'exact')) // 0.1202426
 */
export function hutchinsonKnopoff1978(partials: readonly PureTone[]): number {
  const power = partials.reduce((sum, { amplitude }) => sum + amplitude ** 2, 0);
  if (power === 0) return 0;
  const rough = sumOverPairs(partials, (a, b) => {
    const distance = (b.frequencyHz - a.frequencyHz) / criticalBandwidth(a.frequencyHz, b.frequencyHz);
    return a.amplitude * b.amplitude * pairWeight(distance);
  });
  return rough / power;
}
