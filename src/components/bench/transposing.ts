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
