import type { ChordAnalysis } from '#shared/voicing/analysis';
import { REGISTER_BOUNDS, type Register } from '#shared/voicing/registers';
import type { PitchAxis } from '@/charts/pitch-axis';
import { siltColour } from '@/charts/silt';

/** The muddiness of one register, placed on the axis. */
export interface RegisterBar {
  readonly register: Register;
  readonly name: string;
  /** 0 … 100, whole. */
  readonly index: number;
  readonly colour: string;
  /** Middle of what of the register lies on the axis, or where the bar has room near to it, in pixels. */
  readonly y: number;
  /** Whether the chord's own figure is this one. */
  readonly cloudiest: boolean;
}

/** What a bar needs, in pixels. */
export interface BarSizes {
  readonly bar: number;
  /** Its name, above it. */
  readonly name: number;
}

/** On the bench. */
const BENCH_SIZES: BarSizes = { bar: 22, name: 14 };

/** A register of which less than this shows has no bar of its own: half an octave. */
const LEAST_SHOWN = 6;

/**
 * The bars of the muddiness pane: every register of which enough lies on the axis, and any that clouds.
 * @param sizes what a bar and its name need, in pixels; the bench's own unless given
 * @returns low to high
 */
export function registerBars(
  { muddiness }: ChordAnalysis,
  axis: PitchAxis,
  sizes: BarSizes = BENCH_SIZES,
): readonly RegisterBar[] {
  const indexOf = new Map(muddiness.registers.map(({ register, index }) => [register, index]));
  const bars = REGISTER_BOUNDS.flatMap(({ register, low, high }) => {
    const index = Math.round(indexOf.get(register) ?? 0);
    const [bottom, top] = [Math.max(low, axis.low), Math.min(high, axis.high)];
    if (top <= bottom || (top - bottom < LEAST_SHOWN && index === 0)) return [];
    const y = axis.yOf(Math.max((bottom + top) / 2, axis.low));
    const cloudiest = muddiness.register === register && index > 0;
    return [{ register, name: register, index, colour: siltColour(index), y, cloudiest }];
  });
  return clearOfFoot(bars, axis.height, sizes);
}

/** Keeps the lowest bar above the foot of the axis, where its figures stand, and the next clear of its name. */
function clearOfFoot(
  bars: readonly RegisterBar[],
  foot: number,
  { bar, name }: BarSizes,
): readonly RegisterBar[] {
  let lowest = foot - bar / 2;
  return bars.map((placed) => {
    const y = Math.min(placed.y, lowest);
    lowest = y - bar - name;
    return { ...placed, y };
  });
}
