import type { Extents } from '@/engraving/staff-extents';
import { STAFF_HEIGHT } from '@/engraving/units';

export interface StaffPlaces {
  /** Size of one unit of drawing. */
  readonly scale: number;
  /** Top line of each staff, in the units of `height`. */
  readonly tops: readonly number[];
  /** That they take: the height given, or what they need where that is without end. */
  readonly height: number;
}

/**
 * Sets staves over each other in a given height: as large as may be, the room that is left shared out evenly.
 * @param extents of the staves, from the top, in units of drawing
 * @param height that they may take together; Infinity for as much as they need
 * @param largest scale that is wanted
 * @returns scale and places
 * @example staffPlaces([{ above: 10, below: 10 }], 120, 1).tops // [40]: 60 are needed, 60 left, half on each side
 */
export function staffPlaces(extents: readonly Extents[], height: number, largest: number): StaffPlaces {
  const needed = extents.reduce((sum, { above, below }) => sum + above + STAFF_HEIGHT + below, 0);
  const scale = Math.min(largest, height / needed);
  const share = Number.isFinite(height) ? (height - needed * scale) / extents.length : 0;
  let y = 0;
  const tops = extents.map(({ above, below }) => {
    const top = y + share / 2 + above * scale;
    y += share + (above + STAFF_HEIGHT + below) * scale;
    return top;
  });
  return { scale, tops, height: Number.isFinite(height) ? height : Math.ceil(y) };
}
