import { z } from 'zod';
import { LOW_INTERVAL_LIMITS, type LowIntervalLimit } from '#shared/data/low-interval-limits';
import { midiOfName, PITCH_PATTERN } from '#shared/pitch/names';
import type { Midi, Semitones } from '#shared/units';

/** B0, under every string, to B5, far above every limit. */
export const OWN_LIMIT_BOUNDS: { readonly low: Midi; readonly high: Midi } = { low: 23, high: 83 };

const CHARTED = new Set<Semitones>(LOW_INTERVAL_LIMITS.map(({ semitones }) => semitones));

function withinBounds(name: string): boolean {
  if (!PITCH_PATTERN.test(name)) return false;
  const midi = midiOfName(name);
  return midi >= OWN_LIMIT_BOUNDS.low && midi <= OWN_LIMIT_BOUNDS.high;
}

/** A study's own limit of one interval of the chart. */
export const ownLimitSchema = z.strictObject({
  semitones: z
    .number()
    .int()
    .refine((semitones) => CHARTED.has(semitones), 'a limit is of one of the intervals of the chart'),
  /** The lowest lower note that stays clear, spelt, in scientific notation. */
  lowest: z.string().refine(withinBounds, 'a limit is a note from B0 to B5, such as Bb2'),
});
export type OwnLimit = z.infer<typeof ownLimitSchema>;

/** `null` leaves the published chart in force; a list takes its place, and an interval not in it has no limit. */
export const ownLimitsSchema = z
  .array(ownLimitSchema)
  .max(LOW_INTERVAL_LIMITS.length)
  .refine(
    (limits) => new Set(limits.map(({ semitones }) => semitones)).size === limits.length,
    'an interval has one limit',
  )
  .nullable()
  .default(null);

/**
 * The limits that count: the published chart, or a study's own in its place.
 * @param own a study's own limits; none leaves the chart in force
 * @returns narrow to wide, as the chart gives them
 * @example limitsInForce([{ semitones: 7, lowest: 'C3' }])[0]?.interval // 'P5'
 */
export function limitsInForce(own: readonly OwnLimit[] | null | undefined): readonly LowIntervalLimit[] {
  if (!own) return LOW_INTERVAL_LIMITS;
  return LOW_INTERVAL_LIMITS.flatMap((charted) => {
    const found = own.find(({ semitones }) => semitones === charted.semitones);
    return found ? [{ ...charted, lowest: found.lowest, lowestMidi: midiOfName(found.lowest) }] : [];
  });
}

/**
 * Sets or takes away the own limit of one interval; the first one set takes over the rest of the chart.
 * @param own the limits so far
 * @param semitones an interval of the chart
 * @param lowest the lowest lower note; `null` for no limit
 * @returns the limits; `null` where they say the same as the chart
 * @example withOwnLimit(null, 7, 'C3')?.length // 15
 */
export function withOwnLimit(
  own: readonly OwnLimit[] | null,
  semitones: Semitones,
  lowest: string | null,
): OwnLimit[] | null {
  const changed = limitsInForce(own).flatMap((limit): OwnLimit[] => {
    if (limit.semitones === semitones) return [];
    return [{ semitones: limit.semitones, lowest: limit.lowest }];
  });
  if (lowest !== null) changed.push({ semitones, lowest });
  changed.sort((a, b) => a.semitones - b.semitones);
  return sayTheSameAsChart(changed) ? null : changed;
}

function sayTheSameAsChart(own: readonly OwnLimit[]): boolean {
  return (
    own.length === LOW_INTERVAL_LIMITS.length &&
    LOW_INTERVAL_LIMITS.every(({ semitones, lowestMidi }) =>
      own.some((limit) => limit.semitones === semitones && midiOfName(limit.lowest) === lowestMidi),
    )
  );
}
