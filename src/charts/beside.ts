import { SECTIONS, type Section } from '#shared/strings/sections';
import type { ChordAnalysis } from '#shared/voicing/analysis';
import { REGISTER_BOUNDS } from '#shared/voicing/registers';
import type { PitchAxis } from '@/charts/pitch-axis';
import { siltColour } from '@/charts/silt';

/** A voicing as a small profile on an axis that it shares with others. */
export interface SmallProfile {
  readonly bars: readonly {
    readonly register: string;
    readonly y: number;
    readonly height: number;
    readonly width: number;
    readonly fill: string;
  }[];
  readonly notes: readonly {
    readonly id: string;
    readonly section: Section;
    readonly x: number;
    readonly y: number;
  }[];
}

/** Widths of the two parts of a small profile, in pixels. */
export interface ProfileWidths {
  /** Of the scale from 0 to 100. */
  readonly bars: number;
  /** Of the five lanes beside it. */
  readonly lanes: number;
}

const FULL_SCALE = 100;
const GAP = 1;
const LEAST_WIDTH = 1.5;

/**
 * Lays out a small profile: each register's bar over its own stretch of the axis, and beside it the notes in
 * five narrow lanes.
 * @returns registers of which nothing lies on the axis are left away
 */
export function smallProfile(
  { muddiness, voices }: Pick<ChordAnalysis, 'muddiness' | 'voices'>,
  axis: PitchAxis,
  widths: ProfileWidths,
): SmallProfile {
  const bars = REGISTER_BOUNDS.flatMap(({ register, low, high }) => {
    const [bottom, top] = [Math.max(low, axis.low), Math.min(high, axis.high)];
    const index = muddiness.registers.find((other) => other.register === register)?.index ?? 0;
    if (top <= bottom) return [];
    const y = axis.yOf(top);
    return [
      {
        ...{ register, y, height: axis.yOf(bottom) - y - GAP, fill: siltColour(index) },
        width: Math.max((index / FULL_SCALE) * widths.bars, LEAST_WIDTH),
      },
    ];
  });
  const lane = widths.lanes / SECTIONS.length;
  const notes = voices.map(({ id, section, midi }) => ({
    ...{ id, section, y: axis.yOf(midi) },
    x: widths.bars + lane * (SECTIONS.indexOf(section) + 1 / 2),
  }));
  return { bars, notes };
}
