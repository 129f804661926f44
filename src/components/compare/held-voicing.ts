import type { Chord, Ensemble } from '#shared/study/study.document';
import type { ChordAnalysis } from '#shared/voicing/analysis';

/** The voicing that is held, judged under its own settings, as the bench lays it over its panes. */
export interface HeldVoicing {
  readonly chord: Chord;
  readonly analysis: ChordAnalysis;
  readonly ensemble: Ensemble;
}
