import { createGlobalState, useLocalStorage } from '@vueuse/core';
import { shallowRef } from 'vue';
import type { Chord } from '#shared/study/study.document';
import type { ChordAnalysis } from '#shared/voicing/analysis';
import type { Guess } from '#shared/voicing/guess.sentences';

/** Two notes are the least that can cloud. */
const LEAST_NOTES = 2;

/**
 * Whether this reader wants to guess before they see a chord's figures, kept in this browser and told to nobody;
 * and what they have guessed since the page was opened.
 */
export const useGuessFirst = createGlobalState(() => {
  const on = useLocalStorage('siltline.guess-first', false);
  const guesses = shallowRef<ReadonlyMap<string, Guess>>(new Map());

  /** @returns whether a chord's figures are covered still */
  function covers({ id, voices }: Pick<Chord, 'id' | 'voices'>): boolean {
    return on.value && voices.length >= LEAST_NOTES && !guesses.value.has(id);
  }

  function guess(chordId: string, made: Guess): void {
    guesses.value = new Map([...guesses.value, [chordId, made]]);
  }

  function again(chordId: string): void {
    guesses.value = new Map([...guesses.value].filter(([id]) => id !== chordId));
  }

  /** @returns the analyses of those chords that may be seen */
  function seen(
    chords: readonly Chord[],
    analyses: ReadonlyMap<string, ChordAnalysis>,
  ): ReadonlyMap<string, ChordAnalysis> {
    if (!on.value) return analyses;
    const open = new Set(chords.filter((chord) => !covers(chord)).map(({ id }) => id));
    return new Map([...analyses].filter(([id]) => open.has(id)));
  }

  return { on, guesses, covers, guess, again, seen };
});
