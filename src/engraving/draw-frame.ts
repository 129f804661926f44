import { SECTION_FACTS, SECTIONS } from '#shared/strings/sections';
import { drawText, svgElement } from '@/engraving/draw-signs';
import { SPACE, STAFF_HEIGHT } from '@/engraving/units';

const BRACKET_WIDTH = 4.5;
const BRACKET_BEFORE = 10;
const TIP = 11;
const TIP_HEIGHT = 7;
const NAMES_BEFORE = 22;

/** The room that names and bracket take left of a system. */
export const FRAME_WIDTH = 78;

/**
 * Draws what stands before the staves of a system: the sections' names, the bracket, the line that joins them.
 * @param left edge of the staves
 * @param tops of the staves, downwards
 * @param nameSize size of the names
 */
export function drawFrame(left: number, tops: readonly number[], nameSize: number): SVGGElement {
  const frame = svgElement('g', {});
  const [top, bottom] = [(tops[0] ?? 0) - 3, (tops.at(-1) ?? 0) + STAFF_HEIGHT + 3];
  const x = left - BRACKET_BEFORE;
  const d =
    `M${x + TIP} ${top - TIP_HEIGHT}Q${x + 4} ${top} ${x} ${top}V${bottom}` +
    `Q${x + 4} ${bottom} ${x + TIP} ${bottom + TIP_HEIGHT}`;
  const ink = { fill: 'none', stroke: 'currentColor' };
  frame.append(
    svgElement('path', { ...ink, d, 'stroke-width': BRACKET_WIDTH }),
    svgElement('path', { ...ink, d: `M${left} ${top + 3}V${bottom - 3}`, 'stroke-width': 1.6 }),
  );
  SECTIONS.forEach((section, index) => {
    const y = (tops[index] ?? 0) + STAFF_HEIGHT / 2 + SPACE / 2;
    const look = { size: nameSize, anchor: 'end', weight: 600 } as const;
    frame.append(drawText(SECTION_FACTS[section].short, left - NAMES_BEFORE, y, look));
  });
  return frame;
}
