import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz } from '#shared/units';
import type { Deposit, Profile } from '#shared/voicing/muddiness/axis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import type { Tone } from '#shared/voicing/muddiness/tones';
import { CLOUDING_REACH_ERB, cloudingAt, distanceErb } from '#shared/voicing/muddiness/tones';

/** Partials this far apart neither cloud nor fuse: the reach of fusion is far smaller than that of clouding. */
const REACH = CLOUDING_REACH_ERB;

/**
 * Visits every two partials of two tones that are near enough to meet.
 * @param visit is given their places in the two tones and their difference in bandwidths
 */
export function forEachMeeting(a: Tone, b: Tone, visit: (i: number, j: number, y: number) => void): void {
  let start = 0;
  for (let i = 0; i < a.frequencies.length; i += 1) {
    const frequency = a.frequencies[i] ?? 0;
    while (start < b.frequencies.length && isOutOfReach(b.frequencies[start] ?? 0, frequency)) start += 1;
    for (let j = start; j < b.frequencies.length; j += 1) {
      const other = b.frequencies[j] ?? 0;
      const y = distanceErb(frequency, other);
      if (y >= REACH && other > frequency) break;
      if (y < REACH) visit(i, j, y);
    }
  }
}

function isOutOfReach(lower: Hertz, frequency: Hertz): boolean {
  return lower < frequency && distanceErb(lower, frequency) >= REACH;
}

/**
 * How far the partials of two tones coincide.
 * @returns 0 … about 1
 * @source F = Σ ã_i ã_j exp(−(y/c)²)
 */
export function fusionOf(a: Tone, b: Tone, { fusionErb }: MuddinessConstants): number {
  let fusion = 0;
  forEachMeeting(a, b, (i, j, y) => {
    fusion += (a.amplitudes[i] ?? 0) * (b.amplitudes[j] ?? 0) * Math.exp(-((y / fusionErb) ** 2));
  });
  return fusion;
}

/**
 * The clouding of two tones of unit energy along the pitch axis, smoothed by the window.
 * @source W ∗ r, r(x) = Σ a_i a_j g(|f_i − f_j| / ERB(f̄)) at f̄, divided by 1 + κF
 */
export function cloudingOf(
  a: Tone,
  b: Tone,
  constants: MuddinessConstants,
  a4Hz: Hertz,
  deposit: Deposit,
): Profile {
  const scale = 1 / (1 + constants.fusionStrength * fusionOf(a, b, constants));
  forEachMeeting(a, b, (i, j, y) => {
    const mass = (a.amplitudes[i] ?? 0) * (b.amplitudes[j] ?? 0) * cloudingAt(y, constants) * scale;
    const mean = ((a.frequencies[i] ?? 0) + (b.frequencies[j] ?? 0)) / 2;
    deposit.add(midiOfFrequency(mean, a4Hz), mass);
  });
  return deposit.smooth();
}
