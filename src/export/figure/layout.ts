/** Where a pane stands, in pixels of the figure. */
export interface PaneRoom {
  readonly left: number;
  readonly width: number;
}

export const FIGURE_PANES = ['system', 'sections', 'spacing', 'overtones', 'muddiness'] as const;
export type FigurePane = (typeof FIGURE_PANES)[number];

/** How a figure is laid out. */
export interface FigureLayout {
  readonly width: number;
  /** Room of the panes' headings. */
  readonly head: number;
  /** Height of the pitch axis with its strip. */
  readonly axisHeight: number;
  /** Above C7, where the partials beyond are squeezed. */
  readonly strip: number;
  /** Room of the scales under the panes. */
  readonly foot: number;
  /** Size of the words that matter, and of those beside. */
  readonly text: number;
  readonly small: number;
  /** For the names of the octaves, at the left. */
  readonly labels: number;
  readonly panes: Readonly<Partial<Record<FigurePane, PaneRoom>>>;
}

export type FigureSizes = Omit<FigureLayout, 'panes' | 'labels'>;

/** Parts of the width that the panes take beside each other: our own choice. */
const SHARES: Readonly<Record<FigurePane, number>> = {
  system: 250,
  sections: 360,
  spacing: 200,
  overtones: 205,
  muddiness: 190,
};
/** Widths in sizes of type: of the octaves' names, and between two panes. */
const LABEL_WIDTH = 2.3;
const GAP = 0.9;

/**
 * Shares the width of a figure out to its panes.
 * @param sizes of the whole and its type, in pixels
 * @param panes that are drawn, in the order of the bench
 * @param shares of the width that they take
 * @returns the layout
 * @example figureLayout(sizes, ['sections']).panes.sections?.left // after the octaves' names
 */
export function figureLayout(
  sizes: FigureSizes,
  panes: readonly FigurePane[] = FIGURE_PANES,
  shares: Readonly<Record<FigurePane, number>> = SHARES,
): FigureLayout {
  const labels = sizes.small * LABEL_WIDTH;
  const gap = sizes.text * GAP;
  const shared = panes.reduce((sum, pane) => sum + shares[pane], 0);
  const unit = (sizes.width - labels - gap * (panes.length - 1)) / shared;
  let left = labels;
  const rooms: Partial<Record<FigurePane, PaneRoom>> = {};
  for (const pane of panes) {
    const width = shares[pane] * unit;
    rooms[pane] = { left, width };
    left += width + gap;
  }
  return { ...sizes, labels, panes: rooms };
}
