import type { NoteNaming } from '#shared/pitch/display';
import type { Voice } from '#shared/study/study.document';
import type { ChordAnalysis } from '#shared/voicing/analysis';

/** What a tip looks at. */
export interface TipFacts {
  readonly chord: { readonly voices: readonly Voice[] };
  /** Of the same chord. */
  readonly analysis: Pick<ChordAnalysis, 'voices' | 'limits'>;
  readonly naming: NoteNaming;
}

/** A short remark with the trade's reason for a habit; it says why, and never what must be done. */
export interface Tip {
  /** Kept on the device of whoever has put it away: never given to another tip. */
  readonly id: string;
  /** Where it is from, or that it is common practice. */
  readonly source: string;
  /** @returns what is said where it matters; null where it does not */
  readonly says: (facts: TipFacts) => string | null;
}

export const COMMON_PRACTICE = 'Common practice';
