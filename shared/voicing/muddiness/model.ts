import { equalTempered } from '#shared/pitch/tuning';
import type { Hertz, Semitones } from '#shared/units';
import type { Deposit, PitchAxis, Profile } from '#shared/voicing/muddiness/axis';
import { depositOn, pitchAt, pitchAxis } from '#shared/voicing/muddiness/axis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import { cloudingOf } from '#shared/voicing/muddiness/pairs';
import type { Tone } from '#shared/voicing/muddiness/tones';

/** A voice as the index hears it. */
export interface MuddinessVoice {
  readonly tone: Tone;
  /** Power of the voice's nominal level, any common unit. */
  readonly energy: number;
}

/** The clouding of a chord along the pitch axis. */
export interface Density {
  /** ρ at every point of the axis. */
  readonly density: Float64Array;
  /** (W ∗ r)^m of each pair of voices, weighted by their levels; divided by their sum a pair's share. */
  readonly pairs: readonly PairClouding[];
}

export interface PairClouding {
  readonly first: number;
  readonly second: number;
  /** The pair's pooled clouding at a point. */
  readonly at: (point: number) => number;
}

/** The index's machinery for one axis, one A4 and one set of constants. */
export interface MuddinessModel {
  readonly axis: PitchAxis;
  readonly constants: MuddinessConstants;
  readonly a4Hz: Hertz;
  readonly densityOf: (voices: readonly MuddinessVoice[]) => Density;
}

/** Fundamentals within an octave of a place count for what sounds there. */
const NEIGHBOURHOOD: Semitones = 12;
/** Keeps a silent place from being 0/0: this part of the whole energy, −120 dB. */
const SILENCE = 1e-12;

/**
 * Prepares the index.
 * @param constants fitted; see shared/data/muddiness-constants
 * @param a4Hz places frequencies on the pitch axis
 * @param step of the pitch axis, 0.5 or 0.25 semitones
 * @source ρ(x) = (Σ (W∗r)^m)^(1/m) / (W∗E + ε Ē)^β · h, h = 1 / (1 + (f/f_c)^q)
 */
export function muddinessModel(constants: MuddinessConstants, a4Hz: Hertz, step: Semitones): MuddinessModel {
  const axis = pitchAxis(step, constants.windowSemitones);
  const deposit = depositOn(axis);
  const turn = Float64Array.from({ length: axis.count }, (_, point) => {
    const frequency = equalTempered(pitchAt(axis, point), a4Hz);
    return 1 / (1 + (frequency / constants.cornerHz) ** constants.slope);
  });
  const densityOf = (given: readonly MuddinessVoice[]): Density => {
    const voices = given.filter(({ energy }) => energy > 0);
    const places = voices.map((voice) => given.indexOf(voice));
    const pairs = pairsOf(voices, constants, a4Hz, deposit);
    const density = pooled(pairs, axis.count);
    const local = localEnergy(voices, constants, axis, deposit);
    for (let x = 0; x < axis.count; x += 1) {
      const roughness = (density[x] ?? 0) ** (1 / constants.pooling);
      density[x] =
        roughness === 0 ? 0 : (roughness / (local[x] ?? 1) ** constants.localExponent) * (turn[x] ?? 0);
    }
    return {
      density,
      pairs: pairs.map(({ first, second, profile }) => ({
        first: places[first] ?? first,
        second: places[second] ?? second,
        at: (point) => profile.values[point - profile.from] ?? 0,
      })),
    };
  };
  return { axis, constants, a4Hz, densityOf };
}

interface PairProfile {
  readonly first: number;
  readonly second: number;
  readonly profile: Profile;
}

function pairsOf(
  voices: readonly MuddinessVoice[],
  constants: MuddinessConstants,
  a4Hz: Hertz,
  deposit: Deposit,
): readonly PairProfile[] {
  return voices.flatMap((a, first) =>
    voices.slice(first + 1).map((b, offset) => {
      const { from, values } = cloudingOf(a.tone, b.tone, constants, a4Hz, deposit);
      const level = Math.sqrt(a.energy * b.energy);
      const profile = { from, values: values.map((value) => (value * level) ** constants.pooling) };
      return { first, second: first + 1 + offset, profile };
    }),
  );
}

function pooled(pairs: readonly PairProfile[], count: number): Float64Array {
  const sum = new Float64Array(count);
  for (const { profile } of pairs) addProfile(sum, profile, 1);
  return sum;
}

function addProfile(sum: Float64Array, { from, values }: Profile, scale: number): void {
  for (let i = 0; i < values.length; i += 1) sum[from + i] = (sum[from + i] ?? 0) + scale * (values[i] ?? 0);
}

/** W∗E + εĒ: what sounds at each place, with the voices around it. */
function localEnergy(
  voices: readonly MuddinessVoice[],
  { floor }: MuddinessConstants,
  axis: PitchAxis,
  deposit: Deposit,
): Float64Array {
  const local = new Float64Array(axis.count);
  for (const { tone, energy } of voices) addProfile(local, energyProfile(tone, deposit), energy);
  const silence = SILENCE * voices.reduce((sum, { energy }) => sum + energy, 0);
  for (let x = 0; x < axis.count; x += 1) {
    let weighted = 0;
    let sum = silence;
    for (const { tone, energy } of voices) {
      const weight = neighbourhood(pitchAt(axis, x) - tone.fundamental) * energy;
      weighted += weight * energy;
      sum += weight;
    }
    local[x] = (local[x] ?? 0) + (floor * weighted) / sum + silence;
  }
  return local;
}

function energyProfile(tone: Tone, deposit: Deposit): Profile {
  const octave = NEIGHBOURHOOD;
  for (let i = 0; i < tone.frequencies.length; i += 1) {
    const pitch =
      tone.fundamental + octave * Math.log2((tone.frequencies[i] ?? 0) / (tone.frequencies[0] ?? 1));
    deposit.add(pitch, (tone.amplitudes[i] ?? 0) ** 2);
  }
  return deposit.smooth();
}

function neighbourhood(distance: Semitones): number {
  return Math.abs(distance) >= NEIGHBOURHOOD ? 0 : (1 + Math.cos((Math.PI * distance) / NEIGHBOURHOOD)) / 2;
}
