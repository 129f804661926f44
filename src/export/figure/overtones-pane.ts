import { midiOfFrequency } from '#shared/pitch/tuning';
import { cloudingRows } from '@/charts/clouding';
import { FLOOR_DB, ticksOf } from '@/charts/overtones';
import { coverOf } from '@/export/figure/cover';
import type { PaneInput } from '@/export/figure/figure-input';
import { markAt } from '@/export/figure/mark';
import { words } from '@/export/figure/words';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

const ROW_OPACITY = 0.4;
/** Of the pane, where 0 dB stands: beyond it is the mark of a fundamental. */
const LOUDEST_AT = 0.93;
const TICKS_DB = [-60, -30, 0] as const;

/** Each partial a line from the left to its level, and where they cloud once figures are shown. */
export function overtonesPane(input: PaneInput): readonly SvgNode[] {
  const { analysis, axis, layout, palette, room, a4Hz, shown } = input;
  if (!shown.overtones) return coverOf(input);
  const { text, small } = layout;
  const xOf = (level: number): number =>
    room.left + ((level - FLOOR_DB) / -FLOOR_DB) * room.width * LOUDEST_AT;
  const midiOf = (frequencyHz: number): number => midiOfFrequency(frequencyHz, a4Hz);
  const rows = (shown.figures ? cloudingRows(analysis, axis) : []).map(({ top, height, index }) =>
    svgNode('rect', {
      ...{ x: room.left, y: top, width: room.width, height, 'fill-opacity': ROW_OPACITY },
      fill: palette.silt(index),
    }),
  );
  const ticks = ticksOf({ voices: analysis.voices, axis, midiOf }).flatMap(({ voice, n, level, y }) => [
    svgNode('line', {
      ...{ x1: room.left, x2: xOf(level), y1: y, y2: y, stroke: palette.section(voice.section) },
      'stroke-width': n === 1 ? text / 5 : text / 10,
    }),
    ...(n === 1 ? [markAt(voice.section, xOf(level), y, text * 0.6, palette)] : []),
  ]);
  const scale = TICKS_DB.map((db, index) =>
    words(db === 0 ? '0 dB' : String(db).replace('-', '−'), xOf(db), axis.height + layout.foot / 2, {
      ...{ size: small, fill: palette.quiet },
      anchor: index === 0 ? 'start' : 'middle',
    }),
  );
  const edge = svgNode('line', {
    ...{ x1: room.left, x2: room.left, y1: 0, y2: axis.height, stroke: palette.quiet },
    'stroke-width': text / 10,
  });
  return [...rows, edge, ...ticks, ...scale];
}
