import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Decibels, Hertz } from '#shared/units';
import type { Partial, VoiceSound } from '#shared/voicing/analysis';
import { bandNumber, isAudible, loudestByBand } from '#shared/voicing/audibility';
import { powerOf } from '#shared/voicing/muddiness/joined';
import type { Register } from '#shared/voicing/registers';
import { registerOf, REGISTERS } from '#shared/voicing/registers';

/** How much is heard in one band or register. */
export interface DensityFigure {
  /** Audible partials. */
  readonly partials: number;
  /** Their energy together, 0 dB the level of the partials; null where there are none. */
  readonly levelDb: Decibels | null;
}

export interface BandDensity extends DensityFigure {
  /** Whole equivalent rectangular bandwidths below the band. */
  readonly band: number;
}

export interface RegisterDensity extends DensityFigure {
  readonly register: Register;
}

export interface ChordDensity {
  /** The bands in which something is heard, low to high. */
  readonly bands: readonly BandDensity[];
  /** All seven, low to high. */
  readonly registers: readonly RegisterDensity[];
}

const DB_PER_POWER_DECADE = 10;

/**
 * How densely a chord fills the bands of hearing and the registers: audible partials and their energy. Audible is
 * what lies above the threshold in quiet and is not masked by a partial 20 dB louder in the same band.
 * @param voices as they sound
 * @param a4Hz places partials in registers
 */
export function densityOfChord(voices: readonly Pick<VoiceSound, 'partials'>[], a4Hz: Hertz): ChordDensity {
  const partials = voices.flatMap((voice) => voice.partials);
  const loudest = loudestByBand(partials);
  const audible = partials.filter((partial) => isAudible(partial, loudest));
  const byBand = groupBy(audible, bandNumber);
  const byRegister = groupBy(audible, ({ frequencyHz }) => registerOf(midiOfFrequency(frequencyHz, a4Hz)));
  return {
    bands: [...byBand].sort(([a], [b]) => a - b).map(([band, group]) => ({ band, ...figureOf(group) })),
    registers: REGISTERS.map((register) => ({ register, ...figureOf(byRegister.get(register) ?? []) })),
  };
}

function figureOf(partials: readonly Partial[]): DensityFigure {
  const power = partials.reduce((sum, { levelDb }) => sum + powerOf(levelDb), 0);
  return { partials: partials.length, levelDb: power > 0 ? DB_PER_POWER_DECADE * Math.log10(power) : null };
}

function groupBy<K>(
  partials: readonly Partial[],
  keyOf: (partial: Partial) => K,
): ReadonlyMap<K, readonly Partial[]> {
  const groups = new Map<K, Partial[]>();
  for (const partial of partials) {
    const key = keyOf(partial);
    const group = groups.get(key);
    if (group) group.push(partial);
    else groups.set(key, [partial]);
  }
  return groups;
}
