import type { LowIntervalLimit } from '#shared/data/low-interval-limits';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { midiOfName, parsePitch, pitchName } from '#shared/pitch/names';
import type { Semitones } from '#shared/units';
import type { LimitFinding, VoiceSound } from '#shared/voicing/analysis';

type Note = Pick<VoiceSound, 'id' | 'midi'>;

/** Stands for the lower note of an interval whose root is played elsewhere. */
export const ROOT_ELSEWHERE = 'root-elsewhere';
const OCTAVE: Semitones = 12;

/**
 * The interval from a root that is played elsewhere, taken just below the chord, up to its lowest note.
 * @param notes in any order
 * @param root the root's pitch class, 0 for C
 * @returns the finding, with {@link ROOT_ELSEWHERE} for its lower note; null where it passes no limit
 * @source where the bass is played elsewhere, the interval from that root up to the lowest note is tested too
 * @example rootFinding([E2, B2], 0) // M3 on C2: 10 semitones under B flat 2
 */
export function rootFinding(
  notes: readonly Note[],
  root: number,
  limits: readonly LowIntervalLimit[] = LOW_INTERVAL_LIMITS,
): LimitFinding | null {
  const [lowest] = [...notes].sort((a, b) => a.midi - b.midi);
  if (!lowest) return null;
  const above = (((lowest.midi - root) % OCTAVE) + OCTAVE) % OCTAVE;
  const [finding] = findingOf({ id: ROOT_ELSEWHERE, midi: lowest.midi - above }, lowest, limits);
  return finding ?? null;
}

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

/**
 * A root that is played elsewhere as a pitch: just below the chord, or in unison with its lowest note.
 * @param notes in any order
 * @param root a note without its octave; null where the bass is in the chord
 * @returns the spelt pitch; null without notes or root
 * @throws RangeError where the root is not a note
 * @example rootBelow([E2, B2], 'C') // 'C2'
 */
export function rootBelow(notes: readonly Note[], root: string | null): string | null {
  const [lowest] = [...notes].sort((a, b) => a.midi - b.midi);
  if (!lowest || root === null) return null;
  const spelt = parsePitch(`${root}0`);
  if (!spelt) throw new RangeError(`not a root: ${root}`);
  return pitchName({ ...spelt, octave: Math.floor((lowest.midi - midiOfName(`${root}0`)) / OCTAVE) });
}

/**
 * All that stands under a limit in one chord: pairs of its notes, and its lowest note above a root played elsewhere.
 * @param notes in any order
 * @param root a note without its octave; null where the bass is in the chord
 * @param limits the limits in force
 * @returns the furthest under first
 * @throws RangeError where the root is not a note
 * @example chordLimits([E2, B2], 'C', LOW_INTERVAL_LIMITS)[0]?.semitonesBelow // 10
 */
export function chordLimits(
  notes: readonly Note[],
  root: string | null,
  limits: readonly LowIntervalLimit[],
): readonly LimitFinding[] {
  const pairs = limitFindings(notes, limits);
  const below = rootBelow(notes, root);
  const finding = below === null ? null : rootFinding(notes, midiOfName(below) % OCTAVE, limits);
  return finding ? [...pairs, finding].sort((a, b) => b.semitonesBelow - a.semitonesBelow) : pairs;
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
