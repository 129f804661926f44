import { equalTempered } from '#shared/pitch/tuning';
import type { Hertz, Semitones } from '#shared/units';
import type { PitchAxis } from '#shared/voicing/muddiness/axis';
import { pitchAt, pitchAxis } from '#shared/voicing/muddiness/axis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import { poolingPower } from '#shared/voicing/muddiness/constants';
import type { MuddinessSums } from '#shared/voicing/muddiness/sums';
import { addEntry, clearSums, sumsOn } from '#shared/voicing/muddiness/sums';
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

/** A sounding voice with its table. */
export interface MuddinessEntry {
  readonly table: ToneTable;
  readonly energy: number;
  /** (√E)^m: two of them weigh a pair of voices. */
  readonly weight: number;
}

/** The index's machinery for one axis, one A4 and one set of constants. */
export interface MuddinessModel {
  readonly axis: PitchAxis;
  readonly constants: MuddinessConstants;
  readonly a4Hz: Hertz;
  readonly tables: MuddinessTables;
  /** h at each point of the axis. */
  readonly turn: Float64Array;
  /** x^m. */
  readonly power: (x: number) => number;
  /** Kept for one evaluation after the other, so that none allocates. */
  readonly scratch: MuddinessSums;
}

/**
 * Prepares the index.
 * @param constants fitted; see shared/data/muddiness-constants
 * @param a4Hz places frequencies on the pitch axis
 * @param step of the pitch axis, 0.5 or 0.25 semitones
 * @source ρ(x) = (Σ (W∗r)^m)^(1/m) / (W∗E + ε Ē) · h, h = 1 / (1 + (f/f_c)^q)
 */
export function muddinessModel(constants: MuddinessConstants, a4Hz: Hertz, step: Semitones): MuddinessModel {
  const { cornerHz, slope } = constants;
  const axis = pitchAxis(step);
  return {
    axis,
    constants,
    a4Hz,
    tables: muddinessTables(constants, a4Hz, axis),
    turn: Float64Array.from({ length: axis.count }, (_, point) => {
      const frequency = equalTempered(pitchAt(axis, point), a4Hz);
      return 1 / (1 + (frequency / cornerHz) ** slope);
    }),
    power: poolingPower(constants),
    scratch: sumsOn(axis),
  };
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

/** @returns the highest ρ of a chord anywhere on the axis */
export function peakDensity(model: MuddinessModel, voices: readonly MuddinessVoice[]): number {
  return highestOf(sumsOf(model, voices), model);
}

/** @returns the highest ρ of what voices add up to */
export function highestOf(sums: MuddinessSums, model: MuddinessModel): number {
  let highest = 0;
  for (let x = 0; x < model.axis.count; x += 1) {
    const pooled = pooledAt(sums, x, model);
    if (pooled > highest) highest = pooled;
  }
  return highest ** (1 / model.constants.pooling);
}

/** @returns what a chord's voices add up to, in the model's scratch: it holds until the next evaluation */
function sumsOf(model: MuddinessModel, voices: readonly MuddinessVoice[]): MuddinessSums {
  const sums = model.scratch;
  clearSums(sums);
  const entries: MuddinessEntry[] = [];
  for (const voice of voices) {
    if (voice.energy <= 0) continue;
    const entry = entryOf(voice, model);
    addEntry(sums, entry, entries, model);
    entries.push(entry);
  }
  return sums;
}

/** @returns a sounding voice with its table, computed where it is not known yet */
export function entryOf({ key, makeTone, energy }: MuddinessVoice, model: MuddinessModel): MuddinessEntry {
  return {
    table: model.tables.ofTone(key, makeTone),
    energy,
    weight: Math.sqrt(model.power(energy)),
  };
}

/** ρ^m at a point: comparing needs no root. */
export function pooledAt(sums: MuddinessSums, x: number, model: MuddinessModel): number {
  const clouding = sums.clouding[x] ?? 0;
  if (clouding === 0) return 0;
  const silence = SILENCE * sums.energy;
  const around = (sums.weightedEnergy[x] ?? 0) / ((sums.weight[x] ?? 0) + silence);
  const local = (sums.local[x] ?? 0) + model.constants.floor * around + silence;
  return clouding * model.power((model.turn[x] ?? 0) / local);
}

/** Keeps a silent place from being 0/0: this part of the whole energy, −120 dB. */
export const SILENCE = 1e-12;
