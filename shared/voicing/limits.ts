import type { LowIntervalLimit } from '#shared/data/low-interval-limits';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import type { LimitFinding, VoiceSound } from '#shared/voicing/analysis';

type Note = Pick<VoiceSound, 'id' | 'midi'>;

/**
 * The pairs of notes that stand under their low interval limit, neighbours or not.
 * @param notes in any order
 * @param limits the chart in force
 * @returns the furthest under first
 * @source shared/data/low-interval-limits; the limit holds for every interval of a chord
 * @example limitFindings([C2, E2]) // M3, limit Bb2, 10 semitones under it
 */
export function limitFindings(
  notes: readonly Note[],
  limits: readonly LowIntervalLimit[] = LOW_INTERVAL_LIMITS,
): readonly LimitFinding[] {
  const rising = [...notes].sort((a, b) => a.midi - b.midi);
  const found = rising.flatMap((lower, index) =>
    rising.slice(index + 1).flatMap((upper) => findingOf(lower, upper, limits)),
  );
  return found.sort((a, b) => b.semitonesBelow - a.semitonesBelow);
}

function findingOf(lower: Note, upper: Note, limits: readonly LowIntervalLimit[]): readonly LimitFinding[] {
  const limit = limits.find(({ semitones }) => semitones === upper.midi - lower.midi);
  if (!limit || lower.midi >= limit.lowestMidi) return [];
  return [
    {
      lowerId: lower.id,
      upperId: upper.id,
      interval: limit.interval,
      limit: limit.lowest,
      semitonesBelow: limit.lowestMidi - lower.midi,
    },
  ];
}
