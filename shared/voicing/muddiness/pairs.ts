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
 * @source W ∗ r, r(x) = Σ a_i a_j g(|f_i − f_j| / ERB(f̄)) at f̄, divided by 1 + κF, F = Σ ã_i ã_j exp(−(y/c)²)
 */
export function cloudingOf(
  a: Tone,
  b: Tone,
  constants: MuddinessConstants,
  a4Hz: Hertz,
  deposit: Deposit,
  window: Window,
): Profile {
  const { fusionErb, fusionStrength, reachErb } = constants;
  const { length } = b.frequencies;
  let fusion = 0;
  let start = 0;
  for (let i = 0; i < a.frequencies.length; i += 1) {
    const low = a.frequencies[i] ?? 0;
    for (let j = start; j < length; j += 1) {
      const high = b.frequencies[j] ?? 0;
      const y = distanceErb(low, high);
      if (y >= reachErb) {
        if (high > low) break;
        start = j + 1;
        continue;
      }
      const product = (a.amplitudes[i] ?? 0) * (b.amplitudes[j] ?? 0);
      if (y < FUSION_REACH * fusionErb) {
        fusion += (a.shape[i] ?? 0) * (b.shape[j] ?? 0) * Math.exp(-((y / fusionErb) ** 2));
      }
      deposit.add(midiOfFrequency((low + high) / 2, a4Hz), product * cloudingAt(y, constants));
    }
  }
  return deposit.smooth(window, 1 / (1 + fusionStrength * fusion));
}
