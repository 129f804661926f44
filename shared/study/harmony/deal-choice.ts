import { midiOfName } from '#shared/pitch/names';
import type { ChordTone } from '#shared/study/harmony/harmony';
import type { Midi } from '#shared/units';

/** How a chord is laid out over the five sections. */
export const DEAL_WAYS = ['open', 'close', 'series'] as const;
export type DealWay = (typeof DEAL_WAYS)[number];

/** Which tone the first violins have; where the chord has none such, whatever comes. */
export const TOP_TONES = ['any', 'root', 'third', 'fifth', 'seventh', 'colour'] as const;
export type TopTone = (typeof TOP_TONES)[number];

/** From which note up the basses look for theirs. */
export const LOWEST_NOTES = ['E1', 'A1', 'C2', 'E2'] as const;
export type LowestNote = (typeof LOWEST_NOTES)[number];

export interface DealChoice {
  readonly way: DealWay;
  readonly top: TopTone;
  readonly lowest: LowestNote;
}

/** Open position over a bass in the great octave: common practice for a string orchestra. */
export const DEFAULT_DEAL: DealChoice = { way: 'open', top: 'any', lowest: 'C2' };

const SEVENTH = 7;
const HIGHEST_OF_TRIAD = 5;

/** The degrees that stand for each: a suspended chord has a fourth or second for its third. */
const TOP_DEGREES: Readonly<Record<Exclude<TopTone, 'any' | 'colour'>, readonly number[]>> = {
  root: [1],
  third: [3, 4, 2],
  fifth: [HIGHEST_OF_TRIAD],
  seventh: [SEVENTH, 6],
};

/** @returns the tones of a chord that may stand on top; all of them where the one wished for is not there */
export function topTones(tones: readonly ChordTone[], top: TopTone): readonly ChordTone[] {
  if (top === 'any') return tones;
  const wanted =
    top === 'colour'
      ? tones.filter(({ degree }) => degree > SEVENTH)
      : tones.filter(({ degree }) => TOP_DEGREES[top].includes(degree));
  return wanted.length > 0 ? wanted : tones;
}

/** @returns the note from which the basses look upwards, sounding */
export function lowestOf({ lowest }: DealChoice): Midi {
  return midiOfName(lowest);
}
