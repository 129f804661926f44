import type { Bar, Moment, ScorePlan } from '#shared/notation/score-plan';
import type { StaffEvent, StaffSketch, StaffText } from '@/engraving/staff-sketch';
import { hasStem } from '@/engraving/note-shapes';
import { accidentalRoom } from '@/engraving/room-before';
import { staffExtents, LINE, type Extents } from '@/engraving/staff-extents';

/** Words of a moment that stand over the whole system: the chord's name. */
export interface BarTitle {
  readonly x: number;
  readonly text: string;
  readonly chordId: string;
}

/** One bar of five staves, ready to be drawn, in tenths of a staff space. */
export interface BarSketch {
  readonly number: number;
  readonly width: number;
  readonly staves: readonly StaffSketch[];
  readonly titles: readonly BarTitle[];
  /** Where each chord's stretch lies. */
  readonly spans: readonly BarSpan[];
  readonly last: boolean;
}

export interface BarSpan {
  readonly chordId: string;
  readonly from: number;
  readonly to: number;
  /** Its first stretch; the others are tied to it. */
  readonly begins: boolean;
}

export interface BarLook {
  /** Size of the words, in units of drawing. */
  readonly textSize: number;
  /** The bar begins a line: it has clefs and signature. */
  readonly opens: boolean;
}

const BEFORE_FIRST = 16;
const HEAD = 16;
const BREVE_HEAD = 26;
const NEW_CLEF = 30;
const BEFORE_BAR_LINE = 8;
const CLEF = 44;
const SIGN = 10;
const METRE = 30;
const LEAST_BAR = 80;
/** Longer notes take more room, though not in proportion; common practice. */
const ROOM_PER_ROOT_TICK = 11;
/** Width of a letter, in parts of its size. */
const LETTER = 0.55;
const REST_HALF = 8;

function widthOf(words: readonly string[], size: number): number {
  return Math.max(0, ...words.map((word) => (word.length + 1) * size * LETTER));
}

function trailOf(moment: Moment, textSize: number): number {
  const head = moment.value.sign === 'breve' ? BREVE_HEAD : HEAD;
  const words = moment.staves.flatMap((staff) => staff.words);
  const title = moment.begins === null ? [] : [titleOf(moment)];
  return Math.max(
    head + ROOM_PER_ROOT_TICK * Math.sqrt(moment.value.ticks),
    widthOf([...words, ...title], textSize),
  );
}

function titleOf({ name, begins }: Moment): string {
  return name ?? String(begins ?? '');
}

function newClefs(bar: Bar, index: number): readonly boolean[] {
  const before = bar.moments[index - 1]?.staves.map(({ clef }) => clef) ?? bar.clefs;
  return (bar.moments[index]?.staves ?? []).map(({ clef }, staff) => clef !== before[staff]);
}

function beginningOf(plan: ScorePlan, bar: Bar, opens: boolean): number {
  if (!opens) return BEFORE_FIRST;
  const metre = bar.number === 1 ? METRE : 0;
  return CLEF + Math.abs(plan.signature) * SIGN + metre + BEFORE_FIRST;
}

/** Left edges of the heads, and where the bar ends. */
function placesOf(plan: ScorePlan, bar: Bar, { textSize, opens }: BarLook) {
  const beginning = beginningOf(plan, bar, opens);
  const leads = bar.moments.map(({ staves }, index) => {
    const clef = newClefs(bar, index).some(Boolean) ? NEW_CLEF : 0;
    return clef + Math.max(...staves.map(({ chord }) => accidentalRoom(chord)));
  });
  const trails = bar.moments.map((moment) => trailOf(moment, textSize));
  const after = BEFORE_BAR_LINE + (bar.clefsAfter.some((clef) => clef !== null) ? NEW_CLEF : 0);
  const fixed = beginning + leads.reduce((sum, lead) => sum + lead, 0) + after;
  const free = trails.reduce((sum, trail) => sum + trail, 0);
  const width = Math.max(fixed + free, LEAST_BAR);
  const stretch = (width - fixed) / free;
  let at = beginning;
  const xs = leads.map((lead, index) => {
    const x = at + lead;
    at = x + (trails[index] ?? 0) * stretch;
    return x;
  });
  return { beginning, xs, leads, width };
}

function eventsOf(bar: Bar, staff: number, xs: readonly number[], middle: number): readonly StaffEvent[] {
  const own = bar.moments.map(({ staves }) => staves[staff]);
  const clef = bar.clefs[staff] ?? 'treble';
  const rest = { chord: null, clef, newClef: false, tiedFrom: false, tiedTo: false, words: [], dynamics: [] };
  // A bar's rest is a whole one in its middle, whatever the metre.
  if (own.every((moment) => !moment?.chord)) {
    return [{ ...rest, x: middle, value: { sign: 1, dotted: false, ticks: 0 } }];
  }
  return bar.moments.map((moment, index) => {
    const now = own[index];
    const { value, tiedFrom, tiedTo } = moment;
    const newClef = newClefs(bar, index)[staff] ?? false;
    return { ...rest, ...now, newClef, x: xs[index] ?? 0, value, tiedFrom, tiedTo };
  });
}

function spansOf(bar: Bar, xs: readonly number[], leads: readonly number[], width: number): BarSpan[] {
  const spans: BarSpan[] = [];
  const edge = (index: number): number => (xs[index] ?? 0) - (leads[index] ?? 0) - BEFORE_BAR_LINE;
  bar.moments.forEach(({ chordId, begins }, index) => {
    if (chordId === null) return;
    const from = edge(index);
    const next = index + 1 < xs.length ? edge(index + 1) : width;
    const last = spans.at(-1);
    if (last?.chordId === chordId && begins === null) spans[spans.length - 1] = { ...last, to: next };
    else spans.push({ chordId, from, to: next, begins: begins !== null });
  });
  return spans;
}

/**
 * Lays out one bar: the same places for all five staves.
 * @param plan of the progression
 * @param bar of it
 * @param look size of words, whether it begins a line
 * @returns the bar in tenths of a staff space
 */
export function barSketch(plan: ScorePlan, bar: Bar, look: BarLook): BarSketch {
  const { beginning, xs, leads, width } = placesOf(plan, bar, look);
  const text: StaffText = { size: look.textSize, anchor: 'start' };
  const middle = (beginning + width) / 2 - REST_HALF;
  const staves = bar.clefs.map((clef, staff) => ({
    ...{ width, clef, text, signature: plan.signature, opens: look.opens },
    metre: look.opens && bar.number === 1 ? plan.metre : null,
    events: eventsOf(bar, staff, xs, middle),
    clefAfter: bar.clefsAfter[staff] ?? null,
  }));
  const titles = bar.moments.flatMap((moment, index) =>
    moment.begins === null || moment.chordId === null
      ? []
      : [{ x: xs[index] ?? 0, text: titleOf(moment), chordId: moment.chordId }],
  );
  const spans = spansOf(bar, xs, leads, width);
  return { number: bar.number, width, staves, titles, spans, last: bar.last };
}

/**
 * The room that each of the five staves needs in all of some bars.
 * @param bars of one line
 * @param textSize in units of drawing
 */
export function barsExtents(bars: readonly Bar[], textSize: number): readonly Extents[] {
  const staves = bars[0]?.clefs ?? [];
  return staves.map((_, staff) => {
    const moments = bars.flatMap((bar) =>
      bar.moments.map((moment) => ({ moment, own: moment.staves[staff] })),
    );
    const stemmed = moments.some(({ moment }) => hasStem(moment.value));
    const contents = moments.flatMap(({ own }) => (own ? [own] : []));
    return staffExtents(contents, stemmed, textSize * LINE);
  });
}
