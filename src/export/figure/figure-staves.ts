import type { NotatedStudy } from '#shared/notation/system-plan';
import type { Engraver } from '@/engraving/engraver';
import { figureAxis } from '@/export/figure/figure';
import type { FigureInput } from '@/export/figure/figure-input';
import { drawStaves } from '@/export/figure/staves';
import type { SvgNode } from '@/export/svg/nodes';

/** Words of the staves to those of the figure. */
const STAFF_TEXT = 0.8;

export type StavesSource = Pick<FigureInput, 'layout' | 'chord' | 'naming' | 'palette'> & {
  readonly study: NotatedStudy;
};

/** @returns the staves of a figure on its axis; nothing where its layout has no room for them */
export function figureStaves(
  engraver: Engraver,
  { layout, chord, study, naming, palette }: StavesSource,
): readonly SvgNode[] {
  const room = layout.panes.system;
  if (!room) return [];
  const axis = figureAxis(chord, layout);
  const text = layout.text * STAFF_TEXT;
  return drawStaves(engraver, { chord, study, naming, axis, room, palette, text, leaders: true });
}
