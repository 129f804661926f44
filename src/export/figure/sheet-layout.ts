import { figureLayout, type FigureLayout } from '@/export/figure/layout';

/** The figure on a sheet of paper and in a file: type of 15 in 1000 is 8 points across 186 millimetres. */
const SIZES = { width: 1000, head: 26, axisHeight: 600, strip: 26, foot: 24, text: 15, small: 13 } as const;

export const SHEET_LAYOUT: FigureLayout = figureLayout(SIZES);
