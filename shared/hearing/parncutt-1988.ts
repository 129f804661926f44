import type { Midi, Semitones } from '#shared/units';

/** Weights of the root-supporting intervals above a candidate root, by semitones. */
export type RootSupports = Readonly<Partial<Record<Semitones, number>>>;

/** @source Parncutt 1988, Music Perception 6(1): 1, 1/2, 1/3, 1/4, 1/5, 1/10 for P1 P5 M3 m7 M2 m3 */
export const SUPPORTS_1988: RootSupports = { 0: 1, 7: 1 / 2, 4: 1 / 3, 10: 1 / 4, 2: 1 / 5, 3: 1 / 10 };
/** @source Parncutt 2006, Empirical Musicology Review 1(4): 10, 5, 3, 2, 1 for P1 P5 M3 m7 M2 */
export const SUPPORTS_2006: RootSupports = { 0: 10, 7: 5, 4: 3, 10: 2, 2: 1 };

const KEYS: Semitones = 12;

/** @returns the pitch classes of notes, each once, 0 for C */
function pitchClasses(midi: readonly Midi[]): readonly number[] {
  return [...new Set(midi.map((note) => ((Math.round(note) % KEYS) + KEYS) % KEYS))];
}

/**
 * How well the notes of a chord support each of the twelve keys as its root.
 * @param midi the notes; only their pitch classes count
 * @param supports the weights in force
 * @returns twelve weights, C first
 * @source Parncutt 1988, 2006
 * @example rootSupports([60, 64, 67])[0] // 18: C is supported by C, E and G
 */
export function rootSupports(midi: readonly Midi[], supports = SUPPORTS_2006): readonly number[] {
  const classes = pitchClasses(midi);
  return Array.from({ length: KEYS }, (_, root) =>
    classes.reduce((sum, note) => sum + (supports[(note - root + KEYS) % KEYS] ?? 0), 0),
  );
}

/**
 * How unclear the root of a chord is.
 * @returns 1 (one key alone is supported) or more; 0 for no notes
 * @source Parncutt 1988: √(Σ w / max w)
 * @example rootAmbiguity([60, 64, 67]) // 1.870829
 */
export function rootAmbiguity(midi: readonly Midi[], supports = SUPPORTS_2006): number {
  const weights = rootSupports(midi, supports);
  const most = Math.max(...weights);
  return most === 0 ? 0 : Math.sqrt(weights.reduce((sum, weight) => sum + weight, 0) / most);
}

/**
 * @returns the pitch class of the best supported root, 0 for C; null for no notes
 * @example estimatedRoot([60, 64, 69]) // 9, A
 */
export function estimatedRoot(midi: readonly Midi[], supports = SUPPORTS_2006): number | null {
  const weights = rootSupports(midi, supports);
  const most = Math.max(...weights);
  return most === 0 ? null : weights.indexOf(most);
}
