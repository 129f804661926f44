import type { SpellingKey } from '#shared/pitch/spelling';
import type { Direction } from '#shared/study/transpose';

/** What is transposed. */
export const TRANSPOSED = ['selection', 'chord', 'progression'] as const;
export type Transposed = (typeof TRANSPOSED)[number];

/** How it is: by semitones, or into another key, degree by degree. */
export type Transposing = { readonly what: Transposed } & (
  | { readonly by: 'semitones'; readonly semitones: number }
  | { readonly by: 'key'; readonly to: SpellingKey; readonly direction: Direction }
);

/** Three octaves: further, and hardly a note of a chord stays within the strings. */
export const MOST_SEMITONES = 36;

/**
 * @param typed what stands in the field, a number where it is one
 * @returns what is amiss with it, to be said beside the field; null where it can be moved by
 * @example semitonesTrouble(99) // 'Whole semitones, from −36 to 36'
 */
export function semitonesTrouble(typed: number | string): string | null {
  const fits = typeof typed === 'number' && Number.isInteger(typed) && Math.abs(typed) <= MOST_SEMITONES;
  return fits ? null : `Whole semitones, from −${MOST_SEMITONES} to ${MOST_SEMITONES}`;
}
