import type { PitchAxis } from '#shared/voicing/muddiness/axis';
import { addProfile } from '#shared/voicing/muddiness/axis';
import type { MuddinessEntry, MuddinessModel } from '#shared/voicing/muddiness/model';

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

/** Makes one set of sums equal to another. */
export function copySums(from: MuddinessSums, to: MuddinessSums): void {
  to.clouding.set(from.clouding);
  to.local.set(from.local);
  to.weightedEnergy.set(from.weightedEnergy);
  to.weight.set(from.weight);
  to.energy = from.energy;
}

/** Adds a voice and its pairs with those that are there already. */
export function addEntry(
  sums: MuddinessSums,
  entry: MuddinessEntry,
  others: readonly MuddinessEntry[],
  model: Pick<MuddinessModel, 'tables'>,
): void {
  addPairs(sums, entry, others, model);
  addSound(sums, entry);
}

/** Adds what a voice clouds together with others. */
export function addPairs(
  { clouding }: MuddinessSums,
  { table, weight }: MuddinessEntry,
  others: readonly MuddinessEntry[],
  { tables }: Pick<MuddinessModel, 'tables'>,
): void {
  for (const other of others) addProfile(clouding, tables.ofPair(table, other.table), weight * other.weight);
}

/** Adds what a voice sounds. */
export function addSound(sums: MuddinessSums, { table, energy }: MuddinessEntry): void {
  addProfile(sums.local, table.energy, energy);
  addProfile(sums.weightedEnergy, table.neighbourhood, energy * energy);
  addProfile(sums.weight, table.neighbourhood, energy);
  sums.energy += energy;
}
