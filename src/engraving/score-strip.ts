import type { ScorePlan } from '#shared/notation/score-plan';
import { barSketch, type BarSketch } from '@/engraving/bar-layout';
import { lineTops } from '@/engraving/line-tops';

/** A bar's place in the one long line that the reader scrolls. */
export interface StripBar {
  readonly sketch: BarSketch;
  /** Pixels from the beginning of the first bar. */
  readonly left: number;
}

export interface ScoreSpan {
  readonly chordId: string;
  readonly bar: number;
  readonly left: number;
  readonly width: number;
  readonly begins: boolean;
  readonly label: string;
}

export interface ScoreStrip {
  readonly bars: readonly StripBar[];
  readonly spans: readonly ScoreSpan[];
  readonly width: number;
  readonly height: number;
  /** In units of drawing. */
  readonly tops: readonly number[];
  readonly scale: number;
}

export interface StripRoom {
  /** Pixels. */
  readonly height: number;
  readonly textSize: number;
  readonly titles: number;
  readonly largest: number;
  readonly smallest: number;
}

/**
 * Lays the progression out as one line of bars, its size such that the height suffices.
 * @param plan of the progression
 * @param room height, sizes of the words, the bounds of the scale
 * @param labelOf a chord's title for those who hear the page
 * @returns bars and stretches in pixels; higher than the room where the smallest scale asks for it
 */
export function scoreStrip(
  plan: ScorePlan,
  room: StripRoom,
  labelOf: (chordId: string) => string,
): ScoreStrip {
  const topsAt = (scale: number) =>
    lineTops(plan.bars, { textSize: room.textSize / scale, titles: room.titles / scale });
  const fitted = room.height / topsAt(room.largest).height;
  const scale = Math.max(Math.min(fitted, room.largest), room.smallest);
  const { tops, height } = topsAt(scale);
  const textSize = room.textSize / scale;
  let x = 0;
  const bars = plan.bars.map((bar, index) => {
    const sketch = barSketch(plan, bar, { textSize, opens: index === 0 });
    const left = x;
    x += sketch.width * scale;
    return { sketch, left };
  });
  const spans = bars.flatMap(({ sketch, left }) =>
    sketch.spans.map(({ chordId, from, to, begins }) => ({
      ...{ chordId, begins, bar: sketch.number, label: labelOf(chordId) },
      ...{ left: left + from * scale, width: (to - from) * scale },
    })),
  );
  return { bars, spans, width: x, height: Math.max(height * scale, room.height), tops, scale };
}

/**
 * The bars that lie in a window, and those next to it.
 * @param from left edge of the window, in pixels
 * @param width of the window
 */
export function barsWithin(strip: ScoreStrip, from: number, width: number): readonly StripBar[] {
  const [left, right] = [from - width / 2, from + width * 1.5];
  return strip.bars.filter((bar) => bar.left < right && bar.left + bar.sketch.width * strip.scale > left);
}
