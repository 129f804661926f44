import type { RegisterMuddiness } from '#shared/voicing/analysis';
import { siltColour } from '@/charts/silt';

/** One register of a small profile. */
export interface ProfileBar {
  readonly register: string;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly fill: string;
}

const FULL_SCALE = 100;
const GAP = 1;
/** So that a clear register still shows that it was looked at. */
const LEAST_WIDTH = 1.5;

/**
 * Lays out a small profile of a chord, low registers at the bottom.
 * @param registers low to high
 * @param width of the scale from 0 to 100, in pixels
 * @param height of all registers together, in pixels
 * @example profileBars([{ register: 'great', index: 50, at: 40 }], 40, 10)[0]?.width // 20
 */
export function profileBars(
  registers: readonly Pick<RegisterMuddiness, 'register' | 'index'>[],
  width: number,
  height: number,
): readonly ProfileBar[] {
  const step = height / registers.length;
  return registers.map(({ register, index }, place) => ({
    register,
    y: height - (place + 1) * step,
    width: Math.max((index / FULL_SCALE) * width, LEAST_WIDTH),
    height: step - GAP,
    fill: siltColour(index),
  }));
}
