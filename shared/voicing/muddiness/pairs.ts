import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz } from '#shared/units';
import type { Deposit, Profile, Window } from '#shared/voicing/muddiness/axis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import type { Tone } from '#shared/voicing/muddiness/tones';
import { cloudingAt, distanceErb } from '#shared/voicing/muddiness/tones';

/** Beyond this many times their width in bandwidths partials do not fuse: e^−25. */
const FUSION_REACH = 5;

/**
 * The clouding of two tones of unit energy along the pitch axis, smoothed by the window.
 * @param deposit is left empty
 * @source W ∗ r, r(x) = Σ a_i a_j g(|f_i − f_j| / ERB(f̄)) at f̄, divided by 1 + κF; F as in {@link fusionOf}
 */
export function cloudingOf(
  a: Tone,
  b: Tone,
  constants: MuddinessConstants,
  a4Hz: Hertz,
  deposit: Deposit,
  window: Window,
): Profile {
  const { reachErb } = constants;
  const { length } = b.frequencies;
  let start = 0;
  for (let i = 0; i < a.frequencies.length; i += 1) {
    const low = a.frequencies[i] ?? 0;
    const amplitude = a.amplitudes[i] ?? 0;
    for (let j = start; j < length; j += 1) {
      const high = b.frequencies[j] ?? 0;
      const y = distanceErb(low, high);
      if (y >= reachErb) {
        if (high > low) break;
        start = j + 1;
        continue;
      }
      const clouding = amplitude * (b.amplitudes[j] ?? 0) * cloudingAt(y, constants);
      deposit.add(midiOfFrequency((low + high) / 2, a4Hz), clouding);
    }
  }
  return deposit.smooth(window, 1 / (1 + constants.fusionStrength * fusionOf(a, b, constants)));
}

/**
 * How far the partials of two notes coincide: by their pitches alone, whatever instruments play them.
 * @returns 0 … 1, 1 for a unison
 * @source F = Σ b_i b_j exp(−(y/c)²), b the ideal series 1/n with Σ b² = 1
 * @example fusionOf(a3, e4, constants) > fusionOf(a3, f4, constants) // true: a fifth fuses, a minor sixth hardly
 */
export function fusionOf(a: Tone, b: Tone, { fusionErb }: MuddinessConstants): number {
  const { length } = b.frequencies;
  const reach = FUSION_REACH * fusionErb;
  let fusion = 0;
  let start = 0;
  for (let i = 0; i < a.frequencies.length; i += 1) {
    const low = a.frequencies[i] ?? 0;
    for (let j = start; j < length; j += 1) {
      const high = b.frequencies[j] ?? 0;
      const y = distanceErb(low, high);
      if (y < reach) fusion += (a.series[i] ?? 0) * (b.series[j] ?? 0) * Math.exp(-((y / fusionErb) ** 2));
      else if (high > low) break;
      else start = j + 1;
    }
  }
  return fusion;
}
