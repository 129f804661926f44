import { equalTempered } from '#shared/pitch/tuning';
import type { Hertz, Semitones } from '#shared/units';
import type { PitchAxis } from '#shared/voicing/muddiness/axis';
import { addProfile, pitchAt, pitchAxis } from '#shared/voicing/muddiness/axis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import type { MuddinessTables, ToneTable } from '#shared/voicing/muddiness/tables';
import { muddinessTables } from '#shared/voicing/muddiness/tables';
import type { Tone } from '#shared/voicing/muddiness/tones';

/** A voice as the index hears it. */
export interface MuddinessVoice {
  /** Tells the shapes of tones apart. */
  readonly key: string;
  /** Makes its tone, where the tables do not know it yet. */
  readonly makeTone: () => Tone;
  /** Power of the voice's nominal level, any common unit; 0 is silent. */
  readonly energy: number;
}

/** What a chord's voices add up to along the axis; kept and used again. */
export interface MuddinessSums {
  /** Σ (W∗r)^m over the pairs of voices. */
  readonly clouding: Float64Array;
  /** W∗E. */
  readonly local: Float64Array;
  /** Σ w E_v² and Σ w E_v, whose quotient is Ē. */
  readonly weightedEnergy: Float64Array;
  readonly weight: Float64Array;
  /** The whole energy. */
  energy: number;
}

/** The index's machinery for one axis, one A4 and one set of constants. */
export interface MuddinessModel {
  readonly axis: PitchAxis;
  readonly constants: MuddinessConstants;
  readonly a4Hz: Hertz;
  readonly tables: MuddinessTables;
  /** h^m at each point of the axis. */
  readonly turn: Float64Array;
  /** Kept for one evaluation after the other, so that none allocates. */
  readonly scratch: MuddinessSums;
}

/** Keeps a silent place from being 0/0: this part of the whole energy, −120 dB. */
export const SILENCE = 1e-12;

/**
 * Prepares the index.
 * @param constants fitted; see shared/data/muddiness-constants
 * @param a4Hz places frequencies on the pitch axis
 * @param step of the pitch axis, 0.5 or 0.25 semitones
 * @source ρ(x) = (Σ (W∗r)^m)^(1/m) / (W∗E + ε Ē) · h, h = 1 / (1 + (f/f_c)^q)
 */
export function muddinessModel(constants: MuddinessConstants, a4Hz: Hertz, step: Semitones): MuddinessModel {
  const axis = pitchAxis(step);
  const turn = Float64Array.from({ length: axis.count }, (_, point) => {
    const frequency = equalTempered(pitchAt(axis, point), a4Hz);
    return (1 / (1 + (frequency / constants.cornerHz) ** constants.slope)) ** constants.pooling;
  });
  const tables = muddinessTables(constants, a4Hz, axis);
  return { axis, constants, a4Hz, tables, turn, scratch: sumsOn(axis) };
}

/**
 * The clouding density of a chord.
 * @param voices no two in unison: see joinUnisons
 * @returns ρ at every point of the axis; the array is the caller's
 */
export function densityOf(model: MuddinessModel, voices: readonly MuddinessVoice[]): Float64Array {
  const sums = sumsOf(model, voices);
  const density = new Float64Array(model.axis.count);
  const root = 1 / model.constants.pooling;
  for (let x = 0; x < density.length; x += 1) density[x] = pooledAt(sums, x, model) ** root;
  return density;
}

/** @returns what a chord's voices add up to, in the model's scratch: it holds until the next evaluation */
export function sumsOf(model: MuddinessModel, voices: readonly MuddinessVoice[]): MuddinessSums {
  const entries = entriesOf(voices, model);
  const sums = model.scratch;
  clearSums(sums);
  entries.forEach((entry, index) => addEntry(sums, entry, entries, index, model));
  return sums;
}

/** A sounding voice with its table. */
export interface MuddinessEntry {
  readonly table: ToneTable;
  readonly energy: number;
  /** (√E)^m: two of them weigh a pair of voices. */
  readonly weight: number;
}

/** @returns the voices that sound, with their tables */
export function entriesOf(
  voices: readonly MuddinessVoice[],
  model: MuddinessModel,
): readonly MuddinessEntry[] {
  return voices.filter(({ energy }) => energy > 0).map((voice) => entryOf(voice, model));
}

export function entryOf({ key, makeTone, energy }: MuddinessVoice, model: MuddinessModel): MuddinessEntry {
  return {
    table: model.tables.ofTone(key, makeTone),
    energy,
    weight: energy ** (model.constants.pooling / 2),
  };
}

/** @returns sums of nothing */
export function sumsOn({ count }: PitchAxis): MuddinessSums {
  return {
    clouding: new Float64Array(count),
    local: new Float64Array(count),
    weightedEnergy: new Float64Array(count),
    weight: new Float64Array(count),
    energy: 0,
  };
}

export function clearSums(sums: MuddinessSums): void {
  sums.clouding.fill(0);
  sums.local.fill(0);
  sums.weightedEnergy.fill(0);
  sums.weight.fill(0);
  sums.energy = 0;
}

/** Adds a voice and its pairs with the first few of the others. */
export function addEntry(
  sums: MuddinessSums,
  entry: MuddinessEntry,
  others: readonly MuddinessEntry[],
  count: number,
  { tables }: MuddinessModel,
): void {
  const { table, energy } = entry;
  for (let i = 0; i < count; i += 1) {
    const other = others[i];
    if (other) addProfile(sums.clouding, tables.ofPair(table, other.table), entry.weight * other.weight);
  }
  addProfile(sums.local, table.energy, energy);
  addProfile(sums.weightedEnergy, table.neighbourhood, energy * energy);
  addProfile(sums.weight, table.neighbourhood, energy);
  sums.energy += energy;
}

/** ρ^m at a point. */
export function pooledAt(sums: MuddinessSums, x: number, { constants, turn }: MuddinessModel): number {
  const clouding = sums.clouding[x] ?? 0;
  if (clouding === 0) return 0;
  const silence = SILENCE * sums.energy;
  const around = (sums.weightedEnergy[x] ?? 0) / ((sums.weight[x] ?? 0) + silence);
  const local = (sums.local[x] ?? 0) + constants.floor * around + silence;
  return (clouding * (turn[x] ?? 0)) / local ** constants.pooling;
}
