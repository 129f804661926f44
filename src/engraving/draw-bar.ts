import type { BarSketch } from '@/engraving/bar-layout';
import { drawText, svgElement } from '@/engraving/draw-signs';
import { drawStaff } from '@/engraving/draw-staff';
import type { Engraver } from '@/engraving/engraver';
import { SPACE, STAFF_HEIGHT } from '@/engraving/units';

export interface BarFrame {
  /** Top lines of the staves, downwards. */
  readonly tops: readonly number[];
  readonly titleSize: number;
  /** Foot of the chords' names. */
  readonly titleY: number;
}

const THIN = 1.6;
const THICK = 5;

function barLine(x: number, { tops }: BarFrame, width: number): SVGRectElement {
  const top = tops[0] ?? 0;
  const height = (tops.at(-1) ?? 0) + STAFF_HEIGHT - top;
  return svgElement('rect', { x: x - width, y: top, width, height, fill: 'currentColor', stroke: 'none' });
}

/**
 * Draws a bar of the whole system: its staves, their bar line through all of them, the chords' names over it.
 * @param sketch where everything stands
 * @param frame heights of the staves and of the names
 * @returns the drawing, its left edge and the frame's heights as its own
 */
export function drawBar(engraver: Engraver, sketch: BarSketch, frame: BarFrame): SVGGElement {
  const bar = svgElement('g', { 'data-bar': sketch.number });
  sketch.staves.forEach((staff, index) => {
    const { element } = drawStaff(engraver, staff);
    element.setAttribute('transform', `translate(0 ${frame.tops[index] ?? 0})`);
    bar.append(element);
  });
  for (const { x, text } of sketch.titles) {
    bar.append(drawText(text, x, frame.titleY, { size: frame.titleSize, anchor: 'start', weight: 600 }));
  }
  if (sketch.last) {
    bar.append(barLine(sketch.width - THICK - SPACE / 2, frame, THIN), barLine(sketch.width, frame, THICK));
  } else {
    bar.append(barLine(sketch.width, frame, THIN));
  }
  return bar;
}
