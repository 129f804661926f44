import type { ChordAnalysis } from '#shared/voicing/analysis';
import { NO_CLEAR_DIFFERENCE, differenceText } from '#shared/voicing/comparison.sentences';
import { compareVoicings } from '#shared/voicing/comparison';
import type { PitchAxis } from '@/charts/pitch-axis';
import { registerBars } from '@/charts/register-bars';

/** The muddiness of one register of the held voicing, beside the one now. */
export interface HeldBar {
  readonly register: string;
  /** 0 … 100, whole. */
  readonly held: number;
  /** Middle of the register on the axis, in pixels. */
  readonly y: number;
  /** `−38`, or that there is no clear difference. */
  readonly change: string;
  readonly clear: boolean;
  /** Nothing need be said where neither clouds. */
  readonly told: boolean;
}

/**
 * Outlines of the held voicing's bars, for every register that either voicing shows.
 * @returns low to high
 */
export function heldBars(before: ChordAnalysis, now: ChordAnalysis, axis: PitchAxis): readonly HeldBar[] {
  const changes = new Map(
    compareVoicings(before, now).registers.map((register) => [register.register, register]),
  );
  const places = new Map(
    [...registerBars(before, axis), ...registerBars(now, axis)].map(({ register, y }) => [register, y]),
  );
  return [...places].flatMap(([register, y]) => {
    const change = changes.get(register);
    if (!change) return [];
    const words = change.clear ? differenceText(change) : NO_CLEAR_DIFFERENCE;
    const held = Math.round(change.held);
    const told = held > 0 || Math.round(change.now) > 0;
    return [{ register, held, y, change: words, clear: change.clear, told }];
  });
}
