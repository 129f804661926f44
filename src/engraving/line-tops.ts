import type { Bar } from '#shared/notation/score-plan';
import { barsExtents } from '@/engraving/bar-layout';
import { STAFF_HEIGHT } from '@/engraving/units';

export interface LineLook {
  /** In tenths of a staff space. */
  readonly textSize: number;
  /** Over the highest staff, for the chords' names. */
  readonly titles: number;
}

/** Where the staves of a line stand, under the chords' names, and how high it is. */
export function lineTops(bars: readonly Bar[], { textSize, titles }: LineLook) {
  let y = titles;
  const tops = barsExtents(bars, textSize).map(({ above, below }) => {
    const top = y + above;
    y = top + STAFF_HEIGHT + below;
    return top;
  });
  return { tops, height: y };
}
