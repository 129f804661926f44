import { COMMON_PRACTICE_ORDERINGS } from '#shared/data/common-practice-orderings';
import type { LowIntervalLimit } from '#shared/data/low-interval-limits';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import {
  CLEAR_TRIAD,
  CLOSE_LOW_CHORDS,
  MIDDLE_TRIAD,
  OPEN_CHORDS,
  PASSING_CHORDS,
} from '#shared/data/model-chords';
import { MUDDY_REGISTERS, REGISTER_RATINGS } from '#shared/data/register-ratings';
import { SCORE_CHORDS } from '#shared/data/score-chords';
import type { Midi } from '#shared/units';
import { correlation } from '#shared/voicing/calibration/statistics';
import type { DealtChords } from '#shared/voicing/calibration/dealt-chords';
import { judgeDealt } from '#shared/voicing/calibration/dealt-chords';
import { limitCurves } from '#shared/voicing/calibration/limit-curves';
import type { LimitFit } from '#shared/voicing/calibration/threshold';
import { fitThreshold } from '#shared/voicing/calibration/threshold';
import {
  CALIBRATION_A4,
  namedVoicing,
  scoreVoicing,
  voicingOf,
} from '#shared/voicing/calibration/yardsticks';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import type { MuddinessVoice } from '#shared/voicing/muddiness/model';
import { muddinessModel, peakDensity } from '#shared/voicing/muddiness/model';
import { AXIS_STEP } from '#shared/voicing/muddiness/models';
import { indexOf } from '#shared/voicing/muddiness/scores';

/** How a set of constants does by every yardstick. */
export interface Judgement {
  readonly constants: MuddinessConstants;
  readonly limits: LimitFit;
  /** By how much each ordering of common practice holds: 1 where just as far as it must. */
  readonly orderings: readonly number[];
  /** Pearson's r between the index and the listeners' ratings. */
  readonly correlation: number;
  readonly scoreChords: readonly number[];
  readonly openChords: readonly number[];
  readonly closeChords: readonly number[];
  readonly passingChords: readonly number[];
  /** Chords dealt as an orchestra deals them, with the players of the usual ensemble. */
  readonly dealt: DealtChords;
  readonly clearTriad: number;
  readonly middleTriad: number;
  /** By how much the middle triad moves from the softest dynamic to the loudest. */
  readonly dynamicsMove: number;
  /** The most by which an octave lower is clearer, as a part of ρ: 0 where it never is. */
  readonly largestRipple: number;
}

/** Constants before the threshold is found. */
export type Untuned = Omit<MuddinessConstants, 'threshold'>;

/** Where both of an ordering score over this, the index saturates and ρ is compared instead. */
const SATURATED = 90;
/** There the muddier must lie this much higher in ρ. */
const SATURATED_MARGIN = 0.02;

/**
 * Judges constants by the chart, the orderings, the ratings, real chords and made ones; the threshold is fitted
 * to the chart alone.
 * @param untuned the constants but for the threshold
 * @param chart the chart, or what is left of it where an interval is left out
 */
export function judge(untuned: Untuned, chart: readonly LowIntervalLimit[] = LOW_INTERVAL_LIMITS): Judgement {
  const model = muddinessModel({ ...untuned, threshold: 1 }, CALIBRATION_A4, AXIS_STEP);
  const limits = fitThreshold(limitCurves(model, chart));
  const density = (voices: readonly MuddinessVoice[]) => peakDensity(model, voices);
  const index = (voices: readonly MuddinessVoice[]) => indexOf(density(voices), limits.threshold);
  const rated = REGISTER_RATINGS.filter(({ register }) => register <= MUDDY_REGISTERS);
  return {
    constants: { ...untuned, threshold: limits.threshold },
    limits,
    orderings: COMMON_PRACTICE_ORDERINGS.map(({ muddier, clearer }) =>
      orderingMargin(
        density(namedVoicing(muddier.join(' '))),
        density(namedVoicing(clearer.join(' '))),
        limits.threshold,
      ),
    ),
    correlation: correlation(
      rated.map(({ midi }) => index(voicingOf(midi))),
      rated.map(({ rating }) => rating),
    ),
    scoreChords: SCORE_CHORDS.map((chord) => index(scoreVoicing(chord))),
    openChords: OPEN_CHORDS.map((chord) => index(namedVoicing(chord))),
    closeChords: CLOSE_LOW_CHORDS.map((chord) => index(namedVoicing(chord))),
    passingChords: PASSING_CHORDS.map((chord) => index(namedVoicing(chord))),
    dealt: judgeDealt(index),
    clearTriad: index(namedVoicing(CLEAR_TRIAD)),
    middleTriad: index(namedVoicing(MIDDLE_TRIAD)),
    dynamicsMove: Math.abs(
      index(namedVoicing(MIDDLE_TRIAD, 'fff')) - index(namedVoicing(MIDDLE_TRIAD, 'ppp')),
    ),
    largestRipple: largestRipple(density),
  };
}

/** Intervals and lower notes among which an octave lower was seen to come out clearer, in trials. */
const RIPPLING_INTERVALS = 9;
const RIPPLING_FROM: Midi = 36;
const RIPPLING_TO: Midi = 54;
const OCTAVE = 12;

function largestRipple(density: (voices: readonly MuddinessVoice[]) => number): number {
  let largest = 0;
  for (let semitones = 1; semitones <= RIPPLING_INTERVALS; semitones += 1) {
    for (let lower = RIPPLING_FROM; lower <= RIPPLING_TO; lower += 1) {
      const high = density(voicingOf([lower, lower + semitones]));
      const low = density(voicingOf([lower - OCTAVE, lower - OCTAVE + semitones]));
      largest = Math.max(largest, 1 - low / high);
    }
  }
  return largest;
}

/**
 * How far an ordering holds.
 * @returns 1 where just far enough: a point of the index, or 2 % of ρ where both are over 90
 * @example orderingMargin(0.2, 0.1, 0.1) // 25: an index of 75 against 50
 */
export function orderingMargin(muddier: number, clearer: number, threshold: number): number {
  const a = indexOf(muddier, threshold);
  const b = indexOf(clearer, threshold);
  const saturated = a > SATURATED && b > SATURATED;
  return saturated ? (muddier / clearer - 1) / SATURATED_MARGIN : a - b;
}
