import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Decibels, Hertz } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { HeardPartials } from '#shared/voicing/audibility';
import { hearPartials, isHeard, MOST_BANDS } from '#shared/voicing/audibility';
import type { Register } from '#shared/voicing/registers';
import { registerNumber, REGISTERS } from '#shared/voicing/registers';

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

/** Counts and energies by band or register, gathered partial by partial. */
interface Gathered {
  readonly counts: Uint32Array;
  readonly powers: Float64Array;
}

/**
 * How densely a chord fills the bands of hearing and the registers: audible partials and their energy. Audible is
 * what lies above the threshold in quiet and is not masked by a partial 20 dB louder in the same band.
 * @param voices as they sound
 * @param a4Hz places partials in registers
 * @param heard the same voices' partials, where they are at hand
 */
export function densityOfChord(
  voices: readonly Pick<VoiceSound, 'partials'>[],
  a4Hz: Hertz,
  heard: HeardPartials = hearPartials(voices),
): ChordDensity {
  const loudest = loudestByBand(heard);
  const byBand = gathered(MOST_BANDS);
  const byRegister = gathered(REGISTERS.length);
  for (let place = 0; place < heard.levels.length; place += 1) {
    const band = heard.bands[place] ?? 0;
    if (!isHeard(heard, place, loudest[band] ?? -Infinity)) continue;
    const power = heard.powers[place] ?? 0;
    gather(byBand, band, power);
    gather(byRegister, registerNumber(midiOfFrequency(heard.frequencies[place] ?? 0, a4Hz)), power);
  }
  const bands: BandDensity[] = [];
  byBand.counts.forEach((count, band) => {
    if (count > 0) bands.push({ band, ...figureOf(byBand, band) });
  });
  return { bands, registers: REGISTERS.map((register, i) => ({ register, ...figureOf(byRegister, i) })) };
}

/** The level of the loudest partial of each band. */
export function loudestByBand({ bands, levels }: HeardPartials): Float64Array {
  const loudest = new Float64Array(MOST_BANDS).fill(-Infinity);
  for (let place = 0; place < levels.length; place += 1) {
    const band = bands[place] ?? 0;
    loudest[band] = Math.max(loudest[band] ?? -Infinity, levels[place] ?? -Infinity);
  }
  return loudest;
}

function gathered(size: number): Gathered {
  return { counts: new Uint32Array(size), powers: new Float64Array(size) };
}

function gather({ counts, powers }: Gathered, into: number, power: number): void {
  counts[into] = (counts[into] ?? 0) + 1;
  powers[into] = (powers[into] ?? 0) + power;
}

function figureOf({ counts, powers }: Gathered, of: number): DensityFigure {
  const power = powers[of] ?? 0;
  return { partials: counts[of] ?? 0, levelDb: power > 0 ? DB_PER_POWER_DECADE * Math.log10(power) : null };
}
