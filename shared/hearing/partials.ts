import { equalTempered, midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz, Midi } from '#shared/units';

/** A pure tone as the published measures take it. */
export interface PureTone {
  readonly frequencyHz: Hertz;
  /** Linear, above 0; every measure says whether its unit matters. */
  readonly amplitude: number;
}

/** What every published measure is: partials in, number out. */
export type PartialsMeasure = (partials: readonly PureTone[]) => number;

/** Partials kept where they lie, or each moved to the nearest key. */
export type PartialRounding = 'exact' | 'semitone';

const CONCERT_A: Hertz = 440;
/** The published tables take partials to a millionth of a semitone: nearer ones are one. */
const PLACES_PER_SEMITONE = 1e6;

/**
 * Partials of a chord of harmonic tones with amplitudes 1/n, coinciding ones merged by the root of the sum
 * of their squares: the sound that the published tables of roughness were computed from.
 * @param midi the notes, in equal temperament on 440 Hz
 * @param harmonics partials per note, 1 or more
 * @param rounding whether each partial is moved to the nearest key
 * @source Bigand, Parncutt & Lerdahl 1996 (10 harmonics, rounded); Harrison & Pearce 2020 (11, exact)
 * @example harmonicPartials([69], 2, 'exact') // 440 Hz at 1, 880 Hz at 0.5
 */
export function harmonicPartials(
  midi: readonly Midi[],
  harmonics: number,
  rounding: PartialRounding,
): readonly PureTone[] {
  const powers = new Map<number, number>();
  const places = rounding === 'exact' ? PLACES_PER_SEMITONE : 1;
  for (const note of midi) {
    for (let n = 1; n <= harmonics; n += 1) {
      const pitch = midiOfFrequency(n * equalTempered(note, CONCERT_A), CONCERT_A);
      const place = Math.round(pitch * places);
      powers.set(place, (powers.get(place) ?? 0) + 1 / n ** 2);
    }
  }
  return [...powers].map(([place, power]) => ({
    frequencyHz: equalTempered(place / places, CONCERT_A),
    amplitude: Math.sqrt(power),
  }));
}

/**
 * Adds up a measure of two tones over all pairs of partials, each pair once.
 * @param contribution of a pair, the lower partial first
 * @example sumOverPairs(threeTones, () => 1) // 3
 */
export function sumOverPairs(
  partials: readonly PureTone[],
  contribution: (lower: PureTone, upper: PureTone) => number,
): number {
  const rising = [...partials].sort((a, b) => a.frequencyHz - b.frequencyHz);
  let sum = 0;
  rising.forEach((lower, index) => {
    for (const upper of rising.slice(index + 1)) sum += contribution(lower, upper);
  });
  return sum;
}
