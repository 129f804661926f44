import {
  BASSES_SOUND_LOWER,
  CELLOS_OVER_BASSES,
  LOW_SECOND,
  LOW_THIRD,
  TENTH_FOR_THIRD,
} from '#shared/voicing/tips/bottom.tips';
import { DIVIDED, TWO_PLAYERS } from '#shared/voicing/tips/players.tips';
import type { Tip, TipFacts } from '#shared/voicing/tips/tip';
import { GAP_ABOVE, OCTAVE_UNDER_MELODY } from '#shared/voicing/tips/upper.tips';

/** What matters most to the sound stands first. */
export const TRADE_TIPS: readonly Tip[] = [
  LOW_THIRD,
  LOW_SECOND,
  TENTH_FOR_THIRD,
  DIVIDED,
  TWO_PLAYERS,
  GAP_ABOVE,
  OCTAVE_UNDER_MELODY,
  CELLOS_OVER_BASSES,
  BASSES_SOUND_LOWER,
];

/** A tip as it is shown. */
export interface ShownTip {
  readonly id: string;
  readonly text: string;
  readonly source: string;
}

/**
 * The one tip for a chord: the first that matters there and has not been put away.
 * @param facts the chord and its analysis
 * @param putAway ids of the tips that the reader has put away
 * @returns null where there is none
 * @example tipFor({ chord: { voices: [] }, analysis: { voices: [], limits: [] }, naming: 'english' }, []) // null
 */
export function tipFor(facts: TipFacts, putAway: readonly string[]): ShownTip | null {
  for (const { id, source, says } of TRADE_TIPS) {
    const text = putAway.includes(id) ? null : says(facts);
    if (text !== null) return { id, text, source };
  }
  return null;
}
