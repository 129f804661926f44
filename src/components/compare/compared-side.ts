import type { Voicing } from '#shared/study/voicing';
import type { Side } from '#shared/voicing/blind-rounds';
import type { ChordAnalysis } from '#shared/voicing/analysis';

/** One of the two voicings with what is known of it. */
export interface ComparedSide {
  readonly voicing: Voicing;
  readonly analysis: ChordAnalysis;
}

/** The letters that the two go by. */
export const SIDE_LETTERS: Readonly<Record<Side, string>> = { held: 'A', now: 'B' };
export const SIDES: readonly Side[] = ['held', 'now'];

/** @returns `58 ± 5`, or a dash for a chord without notes */
export function figureText({ voices, muddiness }: ChordAnalysis): string {
  if (voices.length === 0) return '–';
  return `${Math.round(muddiness.index)} ± ${Math.round(muddiness.uncertainty)}`;
}
