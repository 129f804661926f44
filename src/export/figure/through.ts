import { noteName } from '#shared/pitch/display';
import type { PitchAxis } from '@/charts/pitch-axis';
import type { FigureInput } from '@/export/figure/figure-input';
import { words } from '@/export/figure/words';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

const C = { letter: 'C', alteration: 0, octave: 0 } as const;
const NOTE_OPACITY = 0.5;

/** What runs through all panes: the octaves with their names, and a line of its section's colour for each note. */
export function throughLines(input: FigureInput, axis: PitchAxis): readonly SvgNode[] {
  const { palette, layout, naming, analysis } = input;
  const line = (y: number, stroke: string, look: Readonly<Record<string, number>>): SvgNode =>
    svgNode('line', { x1: layout.labels, x2: layout.width, y1: y, y2: y, stroke, ...look });
  const octaves = axis.octaves.flatMap(({ octave, y }) => [
    line(y, palette.line, { 'stroke-width': 1 }),
    words(`${noteName(C, naming)}${octave}`, 0, y, { size: layout.small, fill: palette.quiet }),
  ]);
  const { system, sections } = layout.panes;
  const first = system ? system.left + system.width : (sections?.left ?? layout.labels);
  const notes = analysis.voices.map(({ midi, section }) =>
    svgNode('line', {
      ...{ x1: first, x2: layout.width, y1: axis.yOf(midi), y2: axis.yOf(midi) },
      ...{
        stroke: palette.section(section),
        'stroke-width': layout.text / 10,
        'stroke-opacity': NOTE_OPACITY,
      },
    }),
  );
  return [...octaves, ...notes];
}
