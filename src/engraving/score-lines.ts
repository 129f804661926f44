import type { Bar, ScorePlan } from '#shared/notation/score-plan';
import { barSketch, barsExtents, type BarSketch } from '@/engraving/bar-layout';
import { STAFF_HEIGHT } from '@/engraving/units';

/** A line of the score: bars beside each other that fill its width. */
export interface ScoreLine {
  readonly bars: readonly BarSketch[];
  /** Top lines of the staves. */
  readonly tops: readonly number[];
  readonly height: number;
}

export interface LineRoom {
  /** For the bars, in tenths of a staff space. */
  readonly width: number;
  readonly textSize: number;
  /** Over the highest staff, for the chords' names. */
  readonly titles: number;
}

/** A last line that is shorter than this part of the width is not stretched. */
const STRETCHED_FROM = 0.7;

function breakLines(plan: ScorePlan, { width, textSize }: LineRoom): readonly (readonly Bar[])[] {
  const lines: Bar[][] = [];
  let left = 0;
  for (const bar of plan.bars) {
    const closed = barSketch(plan, bar, { textSize, opens: false }).width;
    const line = lines.at(-1);
    if (line && closed <= left) {
      line.push(bar);
      left -= closed;
    } else {
      lines.push([bar]);
      left = width - barSketch(plan, bar, { textSize, opens: true }).width;
    }
  }
  return lines;
}

/** Where the staves of a line stand, under the chords' names. */
export function lineTops(bars: readonly Bar[], { textSize, titles }: Omit<LineRoom, 'width'>) {
  let y = titles;
  const tops = barsExtents(bars, textSize).map(({ above, below }) => {
    const top = y + above;
    y = top + STAFF_HEIGHT + below;
    return top;
  });
  return { tops, height: y };
}

/**
 * Breaks the progression into lines of a page.
 * @param plan of the progression
 * @param room of a line
 * @returns the lines; all but a short last one fill the width
 */
export function scoreLines(plan: ScorePlan, room: LineRoom): readonly ScoreLine[] {
  const { width, textSize } = room;
  return breakLines(plan, room).map((bars, index, all) => {
    const natural = bars.map((bar, place) => barSketch(plan, bar, { textSize, opens: place === 0 }).width);
    const sum = natural.reduce((total, one) => total + one, 0);
    const short = index === all.length - 1 && sum < width * STRETCHED_FROM;
    const share = short ? 1 : width / sum;
    const sketches = bars.map((bar, place) =>
      barSketch(plan, bar, { textSize, opens: place === 0, atLeast: (natural[place] ?? 0) * share }),
    );
    return { bars: sketches, ...lineTops(bars, room) };
  });
}
