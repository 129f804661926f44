import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { intervalName, withArticle } from '#shared/pitch/interval-names';
import { parsePitch } from '#shared/pitch/names';
import type { ChordAnalysis, LimitFinding, PairShare, VoiceSound } from '#shared/voicing/analysis';
import { rootElsewhereText } from '#shared/voicing/limits.sentences';
import { ROOT_ELSEWHERE } from '#shared/voicing/limits';
import { hertzText, possessive, registerName, semitonesText, sentence } from '#shared/voicing/words';

/** One thing worth saying about two notes of a chord. */
export interface Finding {
  readonly lowerId: string;
  readonly upperId: string;
  /** Of the clouding of the cloudiest register, 0 … 1; null where the pair has no part worth naming in it. */
  readonly share: number | null;
  /** Semitones under its low interval limit; null where it keeps it. */
  readonly semitonesBelow: number | null;
  /** What a musician would say. */
  readonly text: string;
}

/** What can be said of the whole chord. */
export interface Headline {
  /** 0 … 100, whole; null without notes. */
  readonly index: number | null;
  /** Half the width of the band in which the index may lie, whole. */
  readonly uncertainty: number;
  /** Where it is reached and what stands under its limit. */
  readonly text: string;
}

/** Pairs with less of the clouding than this are not worth a sentence: our own choice. */
const LEAST_SHARE = 0.05;
/** A register under this is clear, and nothing is said to cloud it: the first mark of the ramp. */
export const CLEAR_BELOW = 25;

interface Pair {
  readonly lower: VoiceSound;
  readonly upper: VoiceSound;
  readonly limit: LimitFinding | null;
  readonly share: PairShare | null;
}

const keyOf = (ids: { readonly lowerId: string; readonly upperId: string }): string =>
  `${ids.lowerId} ${ids.upperId}`;

function pairsOf(analysis: ChordAnalysis): Pair[] {
  const voices = new Map(analysis.voices.map((voice) => [voice.id, voice]));
  const clouded = analysis.muddiness.index >= CLEAR_BELOW;
  const shares = analysis.pairs.filter(({ share }) => clouded && share >= LEAST_SHARE);
  const shareOf = new Map(shares.map((pair) => [keyOf(pair), pair]));
  const limitOf = new Map(analysis.limits.map((limit) => [keyOf(limit), limit]));
  const all = new Map([...shares, ...analysis.limits].map((pair) => [keyOf(pair), pair]));
  return [...all].flatMap(([key, { lowerId, upperId }]) => {
    const lower = voices.get(lowerId);
    const upper = voices.get(upperId);
    if (!lower || !upper) return [];
    return [{ lower, upper, limit: limitOf.get(key) ?? null, share: shareOf.get(key) ?? null }];
  });
}

function subject({ lower, upper }: Pair, naming: NoteNaming): { text: string; plural: boolean } {
  const [low, high] = [displayPitch(lower.pitch, naming), displayPitch(upper.pitch, naming)];
  const [a, b] = [parsePitch(lower.pitch), parsePitch(upper.pitch)];
  const interval = a && b ? `, ${withArticle(intervalName(a, b))},` : '';
  if (lower.section === upper.section) {
    return { text: `${possessive(lower.section, lower.players)} ${low}–${high}${interval}`, plural: false };
  }
  const owners = [possessive(lower.section, lower.players), possessive(upper.section, upper.players)];
  return { text: `${owners[0]} ${low} and ${owners[1]} ${high}${interval}`, plural: true };
}

function meetingText({ lower, upper, share }: Pair, naming: NoteNaming): string | null {
  const meeting = share?.meetings[0];
  if (!meeting) return null;
  const { lowerN, upperN, differenceHz } = meeting;
  const apart = `stand ${hertzText(differenceHz)} apart and roughen`;
  if (lowerN === 1 && upperN === 1) return `their fundamentals ${apart}`;
  const of = (n: number, { pitch }: VoiceSound): string =>
    `${n === 1 ? 'the fundamental' : `partial ${n}`} of ${displayPitch(pitch, naming)}`;
  return `${of(lowerN, lower)} and ${of(upperN, upper)} ${apart}`;
}

function textOf(pair: Pair, naming: NoteNaming): string {
  const { text, plural } = subject(pair, naming);
  const meeting = meetingText(pair, naming);
  if (pair.limit) {
    const under = semitonesText(pair.limit.semitonesBelow);
    const stands = plural ? `stand ${under} under their` : `stands ${under} under its`;
    return sentence(`${text} ${stands} low limit${meeting ? `; ${meeting}` : ''}.`);
  }
  const where = pair.share ? registerName(pair.share.register) : '';
  const clouds = `${text} ${plural ? 'cloud' : 'clouds'} ${where}`;
  return sentence(`${clouds}${meeting ? `: ${meeting}` : ''}.`);
}

/** What the lowest note does to a root that is played elsewhere, where that passes a limit. */
function rootFindings(analysis: ChordAnalysis, naming: NoteNaming): readonly Finding[] {
  return analysis.limits.flatMap((limit) => {
    const { lowerId, upperId, semitonesBelow } = limit;
    const upper = analysis.voices.find(({ id }) => id === upperId);
    const root = analysis.rootElsewhere;
    if (lowerId !== ROOT_ELSEWHERE || !upper || !root) return [];
    return [
      { lowerId, upperId, share: null, semitonesBelow, text: rootElsewhereText(root, upper, limit, naming) },
    ];
  });
}

/**
 * What clouds a chord and why: the pairs under their low interval limit and those with the largest part in
 * the cloudiest register, the largest part first.
 * @param analysis of the chord
 * @param naming how the reader names notes
 * @returns one finding a pair
 * @example findingsOf(analysis, 'english')[0]?.text // 'The cellos’ C2–E2, a major third, stands …'
 */
export function findingsOf(analysis: ChordAnalysis, naming: NoteNaming): readonly Finding[] {
  const inChord: readonly Finding[] = pairsOf(analysis).map((pair) => ({
    lowerId: pair.lower.id,
    upperId: pair.upper.id,
    share: pair.share?.share ?? null,
    semitonesBelow: pair.limit?.semitonesBelow ?? null,
    text: textOf(pair, naming),
  }));
  return [...inChord, ...rootFindings(analysis, naming)].sort(
    (a, b) => (b.share ?? 0) - (a.share ?? 0) || (b.semitonesBelow ?? 0) - (a.semitonesBelow ?? 0),
  );
}

/**
 * The chord's figure and where it comes from.
 * @example headlineOf(analysis).text // 'cloudiest in the great octave; 2 pairs under their low limits'
 */
export function headlineOf({ voices, muddiness, limits }: ChordAnalysis): Headline {
  if (voices.length === 0) return { index: null, uncertainty: 0, text: 'no notes yet' };
  const index = Math.round(muddiness.index);
  const pairs =
    limits.length === 1 ? '1 pair under its low limit' : `${limits.length} pairs under their low limits`;
  const under = limits.length === 0 ? 'no pair under its low limit' : pairs;
  const place =
    muddiness.register && index > 0 ? `cloudiest in ${registerName(muddiness.register)}` : 'nothing clouds';
  return { index, uncertainty: Math.round(muddiness.uncertainty), text: `${place}; ${under}` };
}
