import type { DealtChords } from '#shared/voicing/calibration/dealt-chords';
import type { Judgement } from '#shared/voicing/calibration/judgement';
import { mean } from '#shared/voicing/calibration/statistics';
import { limitCost } from '#shared/voicing/calibration/threshold';

/**
 * What a judgement costs, in squared semitones of the chart: the limits' distances, and beside them whatever
 * another yardstick is missed by. Each bound is drawn a little inside what must hold, so that a fit that costs
 * little holds with something to spare.
 */
export interface CostParts {
  readonly limits: number;
  readonly orderings: number;
  readonly ratings: number;
  readonly chords: number;
  readonly dealt: number;
  readonly steadiness: number;
}

/** Orderings must hold by 1. */
const ORDERING_MARGIN = 1.5;
const ORDERING_WEIGHT = 0.5;
/** Ratings must correlate at −0.85 or better. */
const CORRELATION = -0.88;
const CORRELATION_UNIT = 0.02;
const CORRELATION_WEIGHT = 0.2;
/** Chords that pass no limit must score 50 or less. */
const SCORE_CHORD_TOP = 47;
/** Open chords must score 55 or less, their mean under 45. */
const OPEN_CHORD_TOP = 52;
const OPEN_CHORD_MEAN = 42;
/** Close low chords must score over 75, chords that pass a limit 55 or more. */
const CLOSE_CHORD_BOTTOM = 80;
const PASSING_CHORD_BOTTOM = 60;
/** Dealt with the basses, open chords and fifths must score 50 or so, octaves less. */
const DEALT_OPEN_TOP = 48.5;
const DEALT_OCTAVE_TOP = 45;
/** The triads must lie over 0 and under 25, and between 25 and 60. */
const CLEAR_TRIAD_TOP = 20;
const CLEAR_TRIAD_BOTTOM = 0.5;
const MIDDLE_TRIAD_BOTTOM = 28;
const MIDDLE_TRIAD_TOP = 55;
/** Points of the index that cost one. */
const INDEX_UNIT = 5;
const CHORD_WEIGHT = 0.5;
/** All dynamics changed alike must move the index by less than 1. */
const DYNAMICS_MOVE = 0.8;
const DYNAMICS_UNIT = 0.2;
/** An octave lower may be clearer by 8 % at most, and seldom. */
const RIPPLE = 0.05;
const RIPPLE_UNIT = 0.02;
const STEADINESS_WEIGHT = 0.2;

/** @returns the parts of the cost; their sum is what the fit makes small */
export function costParts(judgement: Judgement): CostParts {
  const { openChords } = judgement;
  const chords = [
    ...judgement.scoreChords.map((index) => index - SCORE_CHORD_TOP),
    ...openChords.map((index) => index - OPEN_CHORD_TOP),
    mean(openChords) - OPEN_CHORD_MEAN,
    ...judgement.closeChords.map((index) => CLOSE_CHORD_BOTTOM - index),
    ...judgement.passingChords.map((index) => PASSING_CHORD_BOTTOM - index),
    judgement.clearTriad - CLEAR_TRIAD_TOP,
    CLEAR_TRIAD_BOTTOM - judgement.clearTriad,
    MIDDLE_TRIAD_BOTTOM - judgement.middleTriad,
    judgement.middleTriad - MIDDLE_TRIAD_TOP,
  ];
  return {
    limits: limitCost(judgement.limits),
    orderings: ORDERING_WEIGHT * excess(judgement.orderings.map((margin) => ORDERING_MARGIN - margin)),
    ratings: CORRELATION_WEIGHT * excess([(judgement.correlation - CORRELATION) / CORRELATION_UNIT]),
    chords: CHORD_WEIGHT * excess(chords.map((points) => points / INDEX_UNIT)),
    dealt: CHORD_WEIGHT * excess(dealtPoints(judgement.dealt).map((points) => points / INDEX_UNIT)),
    steadiness:
      STEADINESS_WEIGHT *
      excess([
        (judgement.dynamicsMove - DYNAMICS_MOVE) / DYNAMICS_UNIT,
        (judgement.largestRipple - RIPPLE) / RIPPLE_UNIT,
      ]),
  };
}

/** By how many points each chord dealt as an orchestra deals it passes its bound. */
function dealtPoints({ fifths, octaves, open, score, close, passing }: DealtChords): readonly number[] {
  return [
    ...[...fifths, ...open].map((index) => index - DEALT_OPEN_TOP),
    ...octaves.map((index) => index - DEALT_OCTAVE_TOP),
    ...score.map((index) => index - SCORE_CHORD_TOP),
    ...close.map((index) => CLOSE_CHORD_BOTTOM - index),
    ...passing.map((index) => PASSING_CHORD_BOTTOM - index),
  ];
}

/** @returns the whole cost */
export function costOf(judgement: Judgement): number {
  return Object.values(costParts(judgement)).reduce((sum: number, part: number) => sum + part, 0);
}

/** Σ x² over what exceeds 0. */
function excess(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + Math.max(value, 0) ** 2, 0);
}
