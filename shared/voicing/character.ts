import { estimatedRoot, rootAmbiguity, rootSupports } from '#shared/hearing/parncutt-1988';
import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz, Midi, Semitones } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { CommonFundamental } from '#shared/voicing/common-fundamental';
import { commonFundamental } from '#shared/voicing/common-fundamental';
import { powerOf } from '#shared/voicing/muddiness/joined';

/** What a chord is like as a whole; null where it has no notes, or too few. */
export interface ChordCharacter {
  /** The mean pitch, weighted by energy. */
  readonly weight: Midi | null;
  /** From the lowest to the highest note. */
  readonly spread: Semitones;
  /** The mean interval between neighbours, each weighing half of the one below it. */
  readonly openness: Semitones | null;
  /** The centroid of the spectrum, weighted by energy. */
  readonly brightnessHz: Hertz | null;
  readonly fundamental: CommonFundamental | null;
  readonly root: RootClarity | null;
}

/** How clear the chord's root is, after Parncutt. */
export interface RootClarity {
  /** The best supported pitch class, 0 for C. */
  readonly root: number;
  /** Its support, and the bass note's, as shares of all support. */
  readonly rootSupport: number;
  readonly bassSupport: number;
  /** 1 where one root alone is supported; √(Σ w / max w). */
  readonly ambiguity: number;
}

const KEYS = 12;

/**
 * Weight, spread, openness, brightness, common fundamental and root clarity of a chord.
 * @param voices as they sound
 * @param a4Hz places the weight among the notes
 */
export function characterOf(voices: readonly VoiceSound[], a4Hz: Hertz): ChordCharacter {
  const pitches = voices.map(({ midi }) => midi);
  return {
    weight: energyMean(voices, (frequency) => midiOfFrequency(frequency, a4Hz)),
    spread: pitches.length === 0 ? 0 : Math.max(...pitches) - Math.min(...pitches),
    openness: opennessOf(pitches),
    brightnessHz: energyMean(voices, (frequency) => frequency),
    fundamental: commonFundamental(voices.flatMap(({ partials }) => partials[0]?.frequencyHz ?? [])),
    root: rootClarity(pitches),
  };
}

/** The mean over all partials, weighted by their energy. */
function energyMean(voices: readonly VoiceSound[], valueOf: (frequency: Hertz) => number): number | null {
  let sum = 0;
  let energy = 0;
  for (const { partials } of voices) {
    for (const { frequencyHz, levelDb } of partials) {
      const power = powerOf(levelDb);
      sum += power * valueOf(frequencyHz);
      energy += power;
    }
  }
  return energy === 0 ? null : sum / energy;
}

/**
 * The mean interval between neighbouring notes, weighted towards the bottom: each weighs half of the one below.
 * @param pitches in any order; notes in unison count once
 * @returns semitones; null for fewer than two notes
 * @example opennessOf([36, 43, 52]) // (7 + 9 / 2) / 1.5
 */
export function opennessOf(pitches: readonly Midi[]): Semitones | null {
  const rising = [...new Set(pitches)].sort((a, b) => a - b);
  if (rising.length < 2) return null;
  let sum = 0;
  let weights = 0;
  rising.slice(1).forEach((pitch, i) => {
    const weight = 2 ** -i;
    sum += weight * (pitch - (rising[i] ?? pitch));
    weights += weight;
  });
  return sum / weights;
}

/**
 * @param pitches in any order
 * @returns null for no notes
 * @source Parncutt 1988, 2006
 */
export function rootClarity(pitches: readonly Midi[]): RootClarity | null {
  const root = estimatedRoot(pitches);
  if (root === null) return null;
  const supports = rootSupports(pitches);
  const whole = supports.reduce((sum, support) => sum + support, 0);
  const bass = ((Math.min(...pitches) % KEYS) + KEYS) % KEYS;
  return {
    root,
    rootSupport: (supports[root] ?? 0) / whole,
    bassSupport: (supports[bass] ?? 0) / whole,
    ambiguity: rootAmbiguity(pitches),
  };
}
