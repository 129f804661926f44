import type { LowIntervalLimit } from '#shared/data/low-interval-limits';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { costOf } from '#shared/voicing/calibration/cost';
import type { Judgement, Untuned } from '#shared/voicing/calibration/judgement';
import { judge } from '#shared/voicing/calibration/judgement';

/** The constants that the fit moves; the threshold follows from them. */
export const FITTED = [
  'peakErb',
  'fusionErb',
  'fusionStrength',
  'floor',
  'cornerHz',
  'slope',
  'windowSemitones',
  'localWindowSemitones',
] as const;
export type Fitted = (typeof FITTED)[number];

/**
 * The narrowest window, in semitones, that points half a semitone apart still show whole: of a narrower one the
 * highest place falls between them, and halving the step moves some index by more than a point.
 */
const NARROWEST_WINDOW = 2.4;

/**
 * Where the fit begins: round figures near the best of a wide search by chance. Sharpness, pooling and reach are the
 * form's and stay: a square root of the curve fits the chart best of the powers tried, a root of squares lets the
 * cloudiest pairs govern without hiding the others, and at 3.5 bandwidths the curve has died away.
 */
export const START: Untuned = {
  peakErb: 0.25,
  sharpness: 0.5,
  reachErb: 3.5,
  fusionErb: 0.015,
  fusionStrength: 12,
  pooling: 2,
  floor: 0.025,
  cornerHz: 105,
  slope: 2.7,
  windowSemitones: NARROWEST_WINDOW,
  localWindowSemitones: 6.8,
};

/** How far the fit goes. */
export interface FitRange {
  /** The first steps, as parts of a constant. */
  readonly step: number;
  /** Steps are halved when none helps, until they are smaller than this. */
  readonly smallestStep: number;
  readonly mostRounds: number;
}

export const WHOLE_FIT: FitRange = { step: 0.06, smallestStep: 0.006, mostRounds: 60 };
/** From the whole fit's constants a fit without one interval has not far to go. */
export const REFIT: FitRange = { step: 0.03, smallestStep: 0.012, mostRounds: 6 };

export interface Fit {
  readonly judgement: Judgement;
  readonly cost: number;
  readonly rounds: number;
}

/**
 * Moves one constant after the other by a part of itself, keeps what costs less, and goes on along what helped.
 * It uses no chance: the same tables give the same constants.
 * @param start where it begins
 * @param range how far it goes
 * @param limits the chart, or what is left of it
 * @param progress is told the cost after each round
 */
export function fitConstants(
  start: Untuned,
  range: FitRange,
  limits: readonly LowIntervalLimit[] = LOW_INTERVAL_LIMITS,
  progress: (round: number, cost: number) => void = () => undefined,
): Fit {
  const at = (constants: Untuned): Fit => {
    const judgement = judge(constants, limits);
    return { judgement, cost: costOf(judgement), rounds: 0 };
  };
  let best = at(start);
  let rounds = 0;
  for (let step = range.step; step >= range.smallestStep && rounds < range.mostRounds; rounds += 1) {
    const better = sweep(best, step, at);
    if (better.cost < best.cost) best = leap(best, better, at);
    else step /= 2;
    progress(rounds, best.cost);
  }
  return { ...best, rounds };
}

/** One constant set anew, within what the axis can show. */
function moved(constants: Untuned, name: Fitted, value: number): Untuned {
  const least = name === 'windowSemitones' ? NARROWEST_WINDOW : 0;
  return { ...constants, [name]: Math.max(value, least) };
}

/** Tries each constant a step up and down. */
function sweep(from: Fit, step: number, at: (constants: Untuned) => Fit): Fit {
  let best = from;
  for (const name of FITTED) {
    for (const factor of [1 + step, 1 / (1 + step)]) {
      const tried = at(moved(best.judgement.constants, name, best.judgement.constants[name] * factor));
      if (tried.cost < best.cost) {
        best = tried;
        break;
      }
    }
  }
  return best;
}

/** Goes on once more the way that a round went, where that helps. */
function leap(from: Fit, to: Fit, at: (constants: Untuned) => Fit): Fit {
  const before = from.judgement.constants;
  const after = to.judgement.constants;
  const further = FITTED.reduce<Untuned>(
    (constants, name) => moved(constants, name, after[name] ** 2 / before[name]),
    after,
  );
  const tried = at(further);
  return tried.cost < to.cost ? tried : to;
}
