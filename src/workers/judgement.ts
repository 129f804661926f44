import type { Chord } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import { modelLimits, type ModelLimit } from '#shared/voicing/model-limits';
import { weighedMoves, type WeighedMove } from '#shared/voicing/moves/weighed-moves';
import type { SectionPair } from '#shared/voicing/section-pairs';
import { siltlineMap, type SiltlineExtent, type SiltlineMap } from '#shared/voicing/siltline-map';

/** What takes longer than a frame and is therefore asked of a worker. */
export interface Judgements {
  readonly moves: {
    readonly question: { readonly chord: Chord; readonly settings: SoundSettings };
    readonly answer: readonly WeighedMove[];
  };
  readonly limits: { readonly question: SectionPair; readonly answer: readonly ModelLimit[] };
  readonly siltline: {
    readonly question: { readonly pair: SectionPair; readonly extent: SiltlineExtent };
    readonly answer: SiltlineMap;
  };
}

export type JudgementKind = keyof Judgements;

/** How each question is answered: one pure function a kind. */
export const JUDGE: {
  readonly [K in JudgementKind]: (of: Judgements[K]['question']) => Judgements[K]['answer'];
} = {
  moves: ({ chord, settings }) => weighedMoves(chord, settings),
  limits: modelLimits,
  siltline: ({ pair, extent }) => siltlineMap(pair, extent),
};
