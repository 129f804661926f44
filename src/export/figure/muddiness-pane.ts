import { registerBars } from '@/charts/register-bars';
import { coverOf } from '@/export/figure/cover';
import type { PaneInput } from '@/export/figure/figure-input';
import { words } from '@/export/figure/words';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

/** In sizes of type: height of a bar, the room that its figure needs beyond a full one, and its name's. */
const [BAR, FIGURE, NAME] = [1.3, 2.2, 1.3] as const;
const FULL = 100;
const HALF = 50;
const LARGER = 1.3;

/** Muddiness by register, 0 to 100, with the mark at 50. */
export function muddinessPane(input: PaneInput): readonly SvgNode[] {
  const { analysis, axis, layout, palette, room, shown } = input;
  if (!shown.figures) return coverOf(input);
  const { text, small } = layout;
  const full = room.width - text * FIGURE;
  const xOf = (index: number): number => room.left + (index / FULL) * full;
  const half = svgNode('line', {
    ...{ x1: xOf(HALF), x2: xOf(HALF), y1: axis.strip, y2: axis.height, stroke: palette.mark },
    ...{ 'stroke-width': text / 9, 'stroke-dasharray': `${text / 2} ${text / 3}` },
  });
  const bars = registerBars(analysis, axis, { bar: text * BAR, name: small * NAME }).flatMap(
    ({ name, index, y, cloudiest }) => {
      const height = text * BAR;
      const size = cloudiest ? text * LARGER : text;
      return [
        svgNode('rect', {
          ...{ x: room.left, y: y - height / 2, height, width: Math.max(xOf(index) - room.left, 2) },
          ...{ fill: palette.silt(index), stroke: palette.quiet, 'stroke-width': 1 },
        }),
        words(name, room.left + text * 0.3, y - height / 2 - small * 0.65, {
          ...{ size: small, fill: palette.quiet, clear: palette },
        }),
        words(String(index), xOf(index) + text * 0.4, y, {
          ...{ size, fill: palette.ink, weight: 600, clear: palette },
        }),
      ];
    },
  );
  const scale = [0, HALF, FULL].map((index) =>
    words(String(index), xOf(index), axis.height + layout.foot / 2, {
      ...{ size: small, fill: palette.quiet, anchor: index === 0 ? 'start' : 'middle' },
    }),
  );
  const edge = svgNode('line', {
    ...{ x1: room.left, x2: room.left, y1: 0, y2: axis.height, stroke: palette.quiet },
    'stroke-width': text / 10,
  });
  return [edge, half, ...bars, ...scale];
}
