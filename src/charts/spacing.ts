import type { NoteNaming } from '#shared/pitch/display';
import { displayPitch } from '#shared/pitch/display';
import { intervalName, shortIntervalName } from '#shared/pitch/interval-names';
import { parsePitch } from '#shared/pitch/names';
import { midiOfName } from '#shared/pitch/names';
import type { ChordAnalysis, VoiceSound } from '#shared/voicing/analysis';
import { ROOT_ELSEWHERE } from '#shared/voicing/limits';
import { spreadLabels } from '@/charts/spread-labels';
import type { PitchAxis } from '@/charts/pitch-axis';
import { semitonesText } from '#shared/voicing/words';

/** A bracket from one note to another. */
export interface SpacingBracket {
  readonly lowerId: string;
  readonly upperId: string;
  readonly top: number;
  readonly bottom: number;
  /** 0 for neighbours; pairs further apart stand beside them. */
  readonly column: number;
  /** Semitones under the low interval limit, 0 where it is kept. */
  readonly under: number;
  /** Middle of its words; null where there is no room for them. */
  readonly labelY: number | null;
  readonly label: string;
  /** The whole of it, for a reader who cannot see it. */
  readonly spoken: string;
}

/** How the brackets are worded. */
export interface SpacingWords {
  readonly naming: NoteNaming;
  /** Where there is little room. */
  readonly brief: boolean;
  /** From one line of type to the next, in pixels; of the bench's own type unless given. */
  readonly labelGap?: number;
}

/** From one line of 12-pixel type to the next. */
const LABEL_GAP = 15;
const MOST_COLUMNS = 4;

type Placed = Omit<SpacingBracket, 'labelY'>;
type Note = Pick<VoiceSound, 'id' | 'pitch' | 'midi'>;
type Pair = readonly [Note, Note];

/** @param brief says only how far a pair stands under its limit, not its name too */
function words(lower: Note, upper: Note, under: number, { naming, brief }: SpacingWords) {
  const [a, b] = [parsePitch(lower.pitch), parsePitch(upper.pitch)];
  const [name, short] = a && b ? [intervalName(a, b), shortIntervalName(a, b)] : ['', ''];
  const below = under > 0 ? `${Math.round(under)} under` : '';
  const elsewhere = lower.id === ROOT_ELSEWHERE;
  const root = elsewhere ? ', played elsewhere,' : '';
  const notes = `${displayPitch(lower.pitch, naming)}${root} to ${displayPitch(upper.pitch, naming)}`;
  return {
    label: [elsewhere ? 'root' : brief && below ? '' : short, below].filter((part) => part !== '').join(', '),
    spoken: `${notes}: ${name}${under > 0 ? `, ${semitonesText(under)} under its low limit` : ''}`,
  };
}

/** Neighbours first, then the other pairs under their limit, in the order of the analysis. */
function pairsOf({ voices, limits, rootElsewhere }: ChordAnalysis): Pair[] {
  const rising = [...voices].sort((a, b) => a.midi - b.midi);
  const root = rootElsewhere
    ? [{ id: ROOT_ELSEWHERE, pitch: rootElsewhere, midi: midiOfName(rootElsewhere) }]
    : [];
  const byId = new Map([...voices, ...root].map((note): [string, Note] => [note.id, note]));
  const neighbours = rising.slice(1).map((upper, index): Pair => [rising[index] ?? upper, upper]);
  const known = new Set(neighbours.map(([lower, upper]) => `${lower.id} ${upper.id}`));
  const others = limits.flatMap(({ lowerId, upperId }): Pair[] => {
    const [lower, upper] = [byId.get(lowerId), byId.get(upperId)];
    return lower && upper && !known.has(`${lowerId} ${upperId}`) ? [[lower, upper]] : [];
  });
  return [...neighbours.filter(([lower, upper]) => lower.midi !== upper.midi), ...others];
}

/** The first column beside the neighbours in which nothing covers it. */
function columnFor(placed: readonly Placed[], top: number, bottom: number): number {
  const free = (column: number): boolean =>
    placed.every((other) => other.column !== column || other.bottom < top || other.top > bottom);
  let column = 1;
  while (column < MOST_COLUMNS && !free(column)) column += 1;
  return column;
}

/**
 * The brackets of the spacing pane: between neighbouring notes and between any other pair under its limit.
 * Where there is not room for all words, those of pairs under their limit are kept.
 * @returns low pairs last, so that the heavier ones are drawn over the others
 */
export function spacingOf(
  analysis: ChordAnalysis,
  axis: PitchAxis,
  wording: SpacingWords,
): readonly SpacingBracket[] {
  const under = new Map(analysis.limits.map((limit) => [`${limit.lowerId} ${limit.upperId}`, limit]));
  const neighbours = Math.max(analysis.voices.length - 1, 0);
  const placed: Placed[] = [];
  pairsOf(analysis).forEach(([lower, upper], index) => {
    if (upper.midi < axis.low || lower.midi > axis.high) return;
    const [top, bottom] = [axis.yOf(upper.midi), axis.yOf(lower.midi)];
    const below = under.get(`${lower.id} ${upper.id}`)?.semitonesBelow ?? 0;
    const column =
      index < neighbours && isNeighbour(analysis, lower, upper) ? 0 : columnFor(placed, top, bottom);
    const ids = { lowerId: lower.id, upperId: upper.id };
    placed.push({ ...ids, top, bottom, column, under: below, ...words(lower, upper, below, wording) });
  });
  return withLabels(placed, axis, wording.labelGap ?? LABEL_GAP);
}

function isNeighbour({ voices }: ChordAnalysis, lower: Note, upper: Note): boolean {
  return voices.every(({ midi }) => midi <= lower.midi || midi >= upper.midi);
}

function withLabels(placed: readonly Placed[], axis: PitchAxis, gap: number): SpacingBracket[] {
  const room = Math.floor((axis.height - axis.strip) / gap);
  const worded = new Set([...placed].sort((a, b) => b.under - a.under).slice(0, room));
  const labelled = placed.filter((bracket) => worded.has(bracket));
  const middles = labelled.map(({ top, bottom }) => (top + bottom) / 2);
  const bounds = { top: axis.strip, bottom: axis.height - gap / 2 };
  const ys = new Map(spreadLabels(middles, gap, bounds).map((y, index) => [labelled[index], y]));
  return placed
    .map((bracket) => ({ ...bracket, labelY: ys.get(bracket) ?? null }))
    .sort((a, b) => a.under - b.under);
}
