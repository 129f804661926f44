import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz } from '#shared/units';
import type { Deposit, Profile, Window } from '#shared/voicing/muddiness/axis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import type { Tone } from '#shared/voicing/muddiness/tones';
import { cloudingAt, distanceErb } from '#shared/voicing/muddiness/tones';

/** Beyond this many times their width in bandwidths partials do not fuse: e^−25. */
const FUSION_REACH = 5;

/**
 * Visits every two partials of two tones that are near enough to meet.
 * @param reachErb how near, in equivalent rectangular bandwidths
 * @param visit is given their places in the two tones and their difference in bandwidths
 */
export function forEachMeeting(
  a: Tone,
  b: Tone,
  reachErb: number,
  visit: (i: number, j: number, y: number) => void,
): void {
  let start = 0;
  for (let i = 0; i < a.frequencies.length; i += 1) {
    const frequency = a.frequencies[i] ?? 0;
    for (let j = start; j < b.frequencies.length; j += 1) {
      const other = b.frequencies[j] ?? 0;
      const y = distanceErb(frequency, other);
      if (y < reachErb) visit(i, j, y);
      else if (other > frequency) break;
      else start = j + 1;
    }
  }
}

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
  let fusion = 0;
  forEachMeeting(a, b, reachErb, (i, j, y) => {
    const product = (a.amplitudes[i] ?? 0) * (b.amplitudes[j] ?? 0);
    if (y < FUSION_REACH * fusionErb) fusion += product * Math.exp(-((y / fusionErb) ** 2));
    const mean = ((a.frequencies[i] ?? 0) + (b.frequencies[j] ?? 0)) / 2;
    deposit.add(midiOfFrequency(mean, a4Hz), product * cloudingAt(y, constants));
  });
  return deposit.smooth(window, 1 / (1 + fusionStrength * fusion));
}
