import { EASY_BESIDE_OPEN, HAND_SPANS, HIGHEST_EASY_STOP } from '#shared/data/double-stops';
import type { HandSpan } from '#shared/data/double-stops';
import { ratioOf } from '#shared/pitch/intervals';
import type { GradedFinding } from '#shared/strings/grades';
import { lessPlayable, morePlayable } from '#shared/strings/grades';
import type { Instrument } from '#shared/strings/sections';
import type { Midi, Semitones } from '#shared/units';

const EASY: GradedFinding = { grade: 'easy', reason: 'lies well under the hand' };
const NO_STRINGS: GradedFinding = {
  grade: 'not playable',
  reason: 'no two neighbouring strings have both notes',
};
const TOO_MANY: GradedFinding = { grade: 'not playable', reason: 'more notes than neighbouring strings' };
/** Two strings sound together under the bow; three or four only struck. */
const SUSTAINED_NOTES = 2;

/**
 * How playable a double stop is, or a stop of three or four notes, by the distance of the fingers.
 * @param notes sounding pitches, two or more
 * @param instrument whose hand is meant
 * @param openStrings its open strings, in any order
 * @returns the best of all ways to lay the notes on neighbouring strings
 * @source both notes on neighbouring strings, a and b semitones above them; one open: easy up to an octave on the
 *   neighbour; both stopped: d = L |2^(−a/12) − 2^(−b/12)| against the hand's span
 * @example stopFinding([55, 62], 'violin', [76, 69, 62, 55]).grade // 'easy': two open strings
 */
export function stopFinding(
  notes: readonly Midi[],
  instrument: Instrument,
  openStrings: readonly Midi[],
): GradedFinding {
  const strings = [...openStrings].sort((a, b) => a - b);
  if (notes.length > strings.length) return TOO_MANY;
  const span = HAND_SPANS[instrument];
  const ways = Array.from({ length: strings.length - notes.length + 1 }, (_, first) =>
    strings.slice(first, first + notes.length),
  );
  const best = ways
    .flatMap((chosen) => orders(notes).map((order) => layFinding(order, chosen, span)))
    .reduce(morePlayable, NO_STRINGS);
  return notes.length > SUSTAINED_NOTES ? lessPlayable(best, brokenFinding(notes.length)) : best;
}

/** @source Adler, Piston, Kennan, from memory: three-note chords break 2 + 1 or sound forte, four-note 2 + 2 */
function brokenFinding(notes: number): GradedFinding {
  return {
    grade: 'awkward',
    reason: `${notes} notes cannot be held together: struck short and forte, or broken; the upper two can be held`,
  };
}

/** Notes laid in this order on these strings, each on its own. */
function layFinding(notes: readonly Midi[], strings: readonly Midi[], span: HandSpan): GradedFinding {
  const above = notes.map((note, i) => note - (strings[i] ?? note));
  if (above.some((semitones) => semitones < 0)) return NO_STRINGS;
  return above
    .flatMap((a, i) => above.slice(i + 1).map((b) => handFinding(a, b, span)))
    .reduce(lessPlayable, EASY);
}

function handFinding(a: Semitones, b: Semitones, span: HandSpan): GradedFinding {
  const high = Math.max(a, b) > HIGHEST_EASY_STOP;
  const reach = a === 0 || b === 0 ? besideOpen(Math.max(a, b)) : stretch(a, b, span);
  if (!high) return reach;
  return lessPlayable(reach, { grade: 'awkward', reason: 'high above the open string' });
}

function besideOpen(semitones: Semitones): GradedFinding {
  if (semitones <= EASY_BESIDE_OPEN) return EASY;
  return { grade: 'awkward', reason: 'more than an octave above the open string beside it' };
}

function stretch(a: Semitones, b: Semitones, span: HandSpan): GradedFinding {
  const distance = span.stringLengthMm * Math.abs(1 / ratioOf(a) - 1 / ratioOf(b));
  const thumb = span.thumbFrom !== null && Math.min(a, b) >= span.thumbFrom;
  const millimetres = Math.round(distance);
  if (distance <= (thumb ? span.awkwardMm : span.easyMm)) return EASY;
  if (distance <= span.hardMm) return { grade: 'awkward', reason: `a stretch of ${millimetres} mm` };
  return { grade: 'not playable', reason: `a stretch of ${millimetres} mm is beyond the hand` };
}

function orders<T>(items: readonly T[]): readonly (readonly T[])[] {
  if (items.length <= 1) return [items];
  return items.flatMap((item, i) =>
    orders([...items.slice(0, i), ...items.slice(i + 1)]).map((rest) => [item, ...rest]),
  );
}
