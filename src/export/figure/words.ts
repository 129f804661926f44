import type { Palette } from '@/export/palette';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

/** Half the height of a capital, from the foot of a line to its middle, in sizes of type. */
const TO_MIDDLE = 0.35;
/** Of the edge that keeps words clear of the lines that run through them, in sizes of type. */
const EDGE = 0.25;

export interface WordLook {
  readonly size: number;
  readonly fill: string;
  readonly anchor?: 'start' | 'middle' | 'end';
  readonly weight?: number;
  readonly italic?: boolean;
  /** Has an edge of the page's colour. */
  readonly clear?: Palette;
}

/** @returns a line of words with its middle at `y` */
export function words(text: string, x: number, y: number, look: WordLook): SvgNode {
  const { size, fill, anchor = 'start', weight = 400, italic = false, clear } = look;
  const edge: Readonly<Record<string, string | number>> = clear
    ? { stroke: clear.page, 'stroke-width': size * EDGE, 'paint-order': 'stroke', 'stroke-linejoin': 'round' }
    : {};
  return svgNode(
    'text',
    {
      ...{ x, y: y + size * TO_MIDDLE, 'font-size': size, fill, 'text-anchor': anchor },
      ...{ 'font-weight': weight, 'font-style': italic ? 'italic' : 'normal', ...edge },
    },
    [text],
  );
}
