import type { DealWay } from '#shared/study/harmony/deal-choice';
import type { ChordTone } from '#shared/study/harmony/harmony';
import type { Midi, Semitones } from '#shared/units';

/**
 * What speaks against a way of dealing, in points. All of it is common practice of writing for strings, weighed
 * by hand: wide at the bottom, no third or seventh doubled, sevenths and colour above, the fifth left out first.
 */
export interface DealtTone {
  readonly midi: Midi;
  /** The tone of the chord; `null` for a note that is none of them. */
  readonly tone: ChordTone | null;
  /** It stands there already and stays. */
  readonly kept: boolean;
}

const OCTAVE: Semitones = 12;
const FIFTH: Semitones = 7;
const THIRD_DEGREE = 3;
const FIFTH_DEGREE = 5;

/** Under each height the least interval above a note that still stands clear, near enough for dealing. */
const LEAST_ABOVE: readonly { readonly below: Midi; readonly semitones: Semitones }[] = [
  { below: 43, semitones: FIFTH },
  { below: 48, semitones: 5 },
  { below: 55, semitones: 3 },
];
const PER_SEMITONE_TOO_CLOSE = 6;
const PER_SEMITONE_TOO_WIDE = 3;
/** Basses and cellos may stand a twelfth apart. */
const WIDEST_AT_BOTTOM: Semitones = 19;
const CROSSING = 30;

function lowCost(lower: Midi, gap: Semitones): number {
  const least = LEAST_ABOVE.find(({ below }) => lower < below)?.semitones ?? 0;
  return Math.max(0, least - gap) * PER_SEMITONE_TOO_CLOSE;
}

function wideCost(place: number, gap: Semitones): number {
  return Math.max(0, gap - (place === 0 ? WIDEST_AT_BOTTOM : OCTAVE)) * PER_SEMITONE_TOO_WIDE;
}

const OPEN_LEAST: Semitones = 5;
const OPEN_WEIGHT = 3;
const CLOSE_WEIGHT = 1.5;
const CLOSE_CELLO_WEIGHT = 0.3;
const SERIES_WEIGHT = 3;
/** In the series of overtones the octave comes first, then the fifth. */
const SERIES_FIRST: readonly Semitones[] = [OCTAVE, FIFTH];

/** What the way of dealing wants of an interval, given the one below it. */
function wayCost(way: DealWay, place: number, gap: Semitones, below: Semitones | null): number {
  if (way === 'open') return place < 2 ? 0 : Math.max(0, OPEN_LEAST - gap) * OPEN_WEIGHT;
  if (way === 'close') return place === 0 ? 0 : gap * (place === 1 ? CLOSE_CELLO_WEIGHT : CLOSE_WEIGHT);
  const widening = below === null ? 0 : Math.max(0, gap - below) * SERIES_WEIGHT;
  return widening + Math.abs(gap - (SERIES_FIRST[place] ?? gap));
}

/**
 * @param place of the lower note: 0 for the basses
 * @param below the interval beneath the lower note, if there is one
 * @returns what speaks against two neighbouring notes
 */
export function pairCost(
  way: DealWay,
  place: number,
  lower: DealtTone,
  upper: DealtTone,
  below: Semitones | null,
): number {
  const gap = upper.midi - lower.midi;
  if (gap <= 0) return lower.kept || upper.kept ? CROSSING : Infinity;
  return lowCost(lower.midi, gap) + wideCost(place, gap) + wayCost(way, place, gap, below);
}

/** Where each section likes to stand in a chord of five, from the basses up. */
const HEIGHTS: Readonly<Record<DealWay, readonly Midi[]>> = {
  open: [38, 48, 57, 65, 74],
  close: [38, 50, 62, 66, 70],
  series: [38, 48, 55, 60, 64],
};
const PER_SEMITONE_OFF = 0.15;
/** A seventh or a colour belongs above the violas. */
const COLOUR_IN_CELLOS = 8;
const COLOUR_IN_VIOLAS = 2;

export function isColour({ degree }: ChordTone): boolean {
  return degree === 2 || degree === 4 || degree > FIFTH_DEGREE;
}

/** @returns what speaks against a section's note by itself */
export function placeCost(way: DealWay, place: number, { midi, tone, kept }: DealtTone): number {
  if (kept) return 0;
  const off = Math.abs(midi - (HEIGHTS[way][place] ?? midi)) * PER_SEMITONE_OFF;
  if (!tone || !isColour(tone) || place === 0) return off;
  return off + ([0, COLOUR_IN_CELLOS, COLOUR_IN_VIOLAS][place] ?? 0);
}

/** What is lost with a tone; the perfect fifth is missed least. */
const MISSED: Readonly<Record<number, number>> = {
  1: 90,
  2: 100,
  3: 100,
  4: 100,
  6: 80,
  7: 95,
  9: 60,
  11: 55,
  13: 65,
};
const PERFECT_FIFTH_MISSED = 6;
const ALTERED_FIFTH_MISSED = 75;

function missed({ degree, semitones }: ChordTone): number {
  if (degree === FIFTH_DEGREE) return semitones === FIFTH ? PERFECT_FIFTH_MISSED : ALTERED_FIFTH_MISSED;
  return MISSED[degree] ?? 0;
}

const DOUBLED_FIFTH = 2;
const DOUBLED_THIRD = 5;
const DOUBLED_COLOUR = 14;

function doubled({ degree, semitones }: ChordTone): number {
  if (degree === 1) return 0;
  if (degree === FIFTH_DEGREE && semitones === FIFTH) return DOUBLED_FIFTH;
  return degree === THIRD_DEGREE ? DOUBLED_THIRD : DOUBLED_COLOUR;
}

/** @returns what speaks against the choice of tones: those that are missing and those that are there twice */
export function choiceCost(tones: readonly ChordTone[], dealt: readonly DealtTone[]): number {
  return tones.reduce((sum, tone) => {
    const times = dealt.filter((note) => note.tone === tone).length;
    return sum + (times === 0 ? missed(tone) : (times - 1) * doubled(tone));
  }, 0);
}
