import { spacingOf, type SpacingBracket } from '@/charts/spacing';
import type { PaneInput } from '@/export/figure/figure-input';
import { words } from '@/export/figure/words';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

/** In sizes of type: from one line to the next, from column to column, a bracket's arm, where the words begin. */
const [GAP, COLUMN, ARM, LABELS] = [1.25, 0.75, 0.4, 2.7] as const;
/** Thickness of a bracket that keeps its limit; for each semitone under it; at most. In sizes of type. */
const [THIN, FOR_EACH, THICK] = [0.08, 0.02, 0.32] as const;

function bracketLines(bracket: SpacingBracket, input: PaneInput): readonly SvgNode[] {
  const { room, layout, palette } = input;
  const { text } = layout;
  const { column, top, bottom, under, labelY, label } = bracket;
  const x = room.left + text * (0.2 + column * COLUMN);
  const arm = x + text * ARM;
  const ink = under > 0 ? palette.ink : palette.quiet;
  const thickness = under > 0 ? Math.min(THIN * 2 + under * FOR_EACH, THICK) * text : THIN * text;
  const path = svgNode('path', {
    ...{ d: `M${arm} ${top + 1}H${x}V${bottom - 1}H${arm}`, fill: 'none', stroke: ink },
    'stroke-width': thickness,
  });
  if (labelY === null) return [path];
  const labelX = room.left + text * LABELS;
  const leader = svgNode('line', {
    ...{ x1: arm, y1: (top + bottom) / 2, x2: labelX - text * 0.25, y2: labelY },
    ...{ stroke: palette.field, 'stroke-width': text / 16 },
  });
  const weight = under > 0 ? 600 : 400;
  return [path, leader, words(label, labelX, labelY, { size: text, fill: ink, weight, clear: palette })];
}

/** The intervals between the notes; how far they stand under their limits only where figures are shown. */
export function spacingPane(input: PaneInput): readonly SvgNode[] {
  const { analysis, axis, layout, naming, shown } = input;
  const told = shown.figures ? analysis : { ...analysis, limits: [] };
  const wording = { naming, brief: input.brief ?? false, labelGap: layout.text * GAP };
  return spacingOf(told, axis, wording).flatMap((bracket) => bracketLines(bracket, input));
}
