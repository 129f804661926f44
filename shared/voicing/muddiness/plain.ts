import { erbAt } from '#shared/hearing/erb';
import { equalTempered, midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz } from '#shared/units';
import type { PitchAxis } from '#shared/voicing/muddiness/axis';
import { addProfile, depositOn, pitchAt, windowOn } from '#shared/voicing/muddiness/axis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import { SILENCE } from '#shared/voicing/muddiness/model';
import { neighbourWeight } from '#shared/voicing/muddiness/tables';
import type { Tone } from '#shared/voicing/muddiness/tones';

/** A tone and its energy. */
export interface PlainVoice {
  readonly tone: Tone;
  readonly energy: number;
}

/**
 * The clouding density by the plain double loop over all pairs of partials, keeping nothing from one chord to
 * the next: what the tables of the model must agree with.
 * @param voices all sounding, no two in unison
 * @returns ρ at every point of the axis
 * @source the same equations as muddinessModel
 */
export function plainDensity(
  voices: readonly PlainVoice[],
  constants: MuddinessConstants,
  a4Hz: Hertz,
  axis: PitchAxis,
): Float64Array {
  const clouding = plainClouding(voices, constants, a4Hz, axis);
  const local = plainLocalEnergy(voices, constants, axis);
  return clouding.map((value, x) => {
    const frequency = equalTempered(pitchAt(axis, x), a4Hz);
    const turn = 1 / (1 + (frequency / constants.cornerHz) ** constants.slope);
    return value === 0 ? 0 : (value ** (1 / constants.pooling) / (local[x] ?? 0)) * turn;
  });
}

function plainClouding(
  voices: readonly PlainVoice[],
  constants: MuddinessConstants,
  a4Hz: Hertz,
  axis: PitchAxis,
): Float64Array {
  const sum = new Float64Array(axis.count);
  const deposit = depositOn(axis);
  const window = windowOn(axis, constants.windowSemitones);
  voices.forEach((a, first) => {
    for (const b of voices.slice(first + 1)) {
      const fusion = meetAll(a.tone, b.tone, constants, (meanHz, mass) =>
        deposit.add(midiOfFrequency(meanHz, a4Hz), mass),
      );
      const level = Math.sqrt(a.energy * b.energy) / (1 + constants.fusionStrength * fusion);
      const { from, values } = deposit.smooth(window, level);
      addProfile(sum, { from, values: values.map((value) => value ** constants.pooling) }, 1);
    }
  });
  return sum;
}

/** Every partial of one tone with every partial of the other; returns how far they fuse. */
function meetAll(
  a: Tone,
  b: Tone,
  { peakErb, sharpness, reachErb, fusionErb }: MuddinessConstants,
  meet: (meanHz: Hertz, mass: number) => void,
): number {
  let fusion = 0;
  for (let i = 0; i < a.frequencies.length; i += 1) {
    for (let j = 0; j < b.frequencies.length; j += 1) {
      const low = a.frequencies[i] ?? 0;
      const high = b.frequencies[j] ?? 0;
      const mean = (low + high) / 2;
      const y = Math.abs(low - high) / erbAt(mean);
      const product = (a.amplitudes[i] ?? 0) * (b.amplitudes[j] ?? 0);
      fusion += (a.series[i] ?? 0) * (b.series[j] ?? 0) * Math.exp(-((y / fusionErb) ** 2));
      if (y < reachErb) meet(mean, product * ((y / peakErb) * Math.exp(1 - y / peakErb)) ** sharpness);
    }
  }
  return fusion;
}

function plainLocalEnergy(
  voices: readonly PlainVoice[],
  { floor, localWindowSemitones }: MuddinessConstants,
  axis: PitchAxis,
): Float64Array {
  const deposit = depositOn(axis);
  const local = new Float64Array(axis.count);
  const silence = SILENCE * voices.reduce((sum, { energy }) => sum + energy, 0);
  for (const { tone, energy } of voices) {
    tone.pitches.forEach((pitch, i) => deposit.add(pitch, energy * (tone.amplitudes[i] ?? 0) ** 2));
  }
  addProfile(local, deposit.smooth(windowOn(axis, localWindowSemitones), 1), 1);
  return local.map((value, x) => {
    let weighted = 0;
    let weight = silence;
    for (const { tone, energy } of voices) {
      const near = neighbourWeight(pitchAt(axis, x) - tone.fundamental) * energy;
      weighted += near * energy;
      weight += near;
    }
    return value + (floor * weighted) / weight + silence;
  });
}
