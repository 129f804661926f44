import type { NoteNaming } from '#shared/pitch/display';
import type { Chord, Ensemble } from '#shared/study/study.document';
import type { ChordAnalysis } from '#shared/voicing/analysis';
import type { PitchAxis } from '@/charts/pitch-axis';
import type { FigureLayout, PaneRoom } from '@/export/figure/layout';
import type { Palette } from '@/export/palette';
import type { SvgNode } from '@/export/svg/nodes';

/** What a figure is drawn from. */
export interface FigureInput {
  readonly chord: Chord;
  readonly analysis: ChordAnalysis;
  readonly ensemble: Ensemble;
  readonly a4Hz: number;
  readonly naming: NoteNaming;
  readonly palette: Palette;
  readonly layout: FigureLayout;
  /** What of the pane of staves is drawn already; nothing while the notation is not at hand. */
  readonly staves: readonly SvgNode[];
  /** Brackets under their limit say only how far, so that it reads from afar. */
  readonly brief?: boolean;
  /** What a reader may see already: what is covered is not in the drawing at all. */
  readonly shown: { readonly overtones: boolean; readonly figures: boolean };
}

/** What each pane is drawn from. */
export interface PaneInput extends FigureInput {
  readonly axis: PitchAxis;
  readonly room: PaneRoom;
}
