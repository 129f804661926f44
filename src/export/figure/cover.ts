import type { PaneInput } from '@/export/figure/figure-input';
import { words } from '@/export/figure/words';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

const ASK = 3;

/** What lies in the place of a pane that is still to be guessed. */
export function coverOf({ room, axis, layout, palette }: PaneInput): readonly SvgNode[] {
  const { text } = layout;
  return [
    svgNode('rect', {
      ...{ x: room.left, y: 0, width: room.width, height: axis.height, rx: text / 4 },
      ...{ fill: palette.surface, stroke: palette.line },
    }),
    words('?', room.left + room.width / 2, axis.height / 2, {
      ...{ size: text * ASK, fill: palette.quiet, anchor: 'middle' },
    }),
  ];
}
