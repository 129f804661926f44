import { figureLayout, type FigureLayout, type FigurePane } from '@/export/figure/layout';

/** Parts of the width and height that make the size of the type: a quarter of it can still be read. Chosen. */
const [ACROSS, DOWN] = [54, 21] as const;
const [LEAST, MOST] = [14, 60] as const;
const SMALL = 0.78;
/** In sizes of type: headings, what lies over C7, the scales. */
const [HEAD, STRIP, FOOT] = [1.5, 0.9, 1.2] as const;
/** Under this width there is room for three panes. */
const NARROW = 760;

const WIDE_PANES: readonly FigurePane[] = ['system', 'sections', 'spacing', 'overtones', 'muddiness'];
const NARROW_PANES: readonly FigurePane[] = ['sections', 'overtones', 'muddiness'];
const SHARES: Readonly<Record<FigurePane, number>> = {
  system: 245,
  sections: 440,
  spacing: 180,
  overtones: 190,
  muddiness: 230,
};

/**
 * The figure for a class: type as large as the room allows.
 * @param width of the room, in pixels
 * @param height of the room, in pixels
 */
export function projectorLayout(width: number, height: number): FigureLayout {
  const text = Math.min(Math.max(Math.min(width / ACROSS, height / DOWN), LEAST), MOST);
  const head = text * HEAD;
  const foot = text * FOOT;
  const sizes = { width, head, foot, text, small: text * SMALL, strip: text * STRIP };
  const axisHeight = Math.max(height - head - foot, (text * DOWN) / 2);
  return figureLayout({ ...sizes, axisHeight }, width < NARROW ? NARROW_PANES : WIDE_PANES, SHARES);
}
