import type { LowIntervalLimit } from '#shared/data/low-interval-limits';
import type { Midi, Semitones } from '#shared/units';
import type { LimitCurve } from '#shared/voicing/calibration/limit-curves';
import { fromNearestVariant, limitOnCurve } from '#shared/voicing/calibration/limit-curves';
import { rootMeanSquare } from '#shared/voicing/calibration/statistics';

/** One interval of the chart beside the model. */
export interface LimitComparison {
  readonly limit: LowIntervalLimit;
  /** The model's limit; null where it has none. */
  readonly model: Midi | null;
  /** Model less chart. */
  readonly fromChart: Semitones;
  /** Model less the nearest published variant. */
  readonly fromVariant: Semitones;
}

export interface LimitFit {
  readonly threshold: number;
  readonly comparisons: readonly LimitComparison[];
  readonly rmsFromChart: Semitones;
  readonly rmsFromVariant: Semitones;
}

/** What a missing limit counts as: an octave off. */
const MISSING: Semitones = 12;
/** The chart's own line counts a quarter of the nearest variant: the variants are as good as it. */
const CHART_PART = 0.25;
/** The thresholds tried: e^−6 to e^0 by 1 %. */
const LOWEST_LOG = -6;
const LOG_STEP = 0.01;
const LOG_STEPS = 600;

/**
 * @returns what the limits cost: the squares of their distances from the variants and, less, from the chart
 * @example limitCost({ rmsFromVariant: 1, rmsFromChart: 2 }) // 2
 */
export function limitCost({
  rmsFromChart,
  rmsFromVariant,
}: Pick<LimitFit, 'rmsFromChart' | 'rmsFromVariant'>): number {
  return rmsFromVariant ** 2 + CHART_PART * rmsFromChart ** 2;
}

/** @returns the chart beside the model at a threshold */
export function compareLimits(curves: readonly LimitCurve[], threshold: number): LimitFit {
  const comparisons = curves.map((curve) => {
    const model = limitOnCurve(curve, threshold);
    const { limit } = curve;
    return {
      limit,
      model,
      fromChart: model === null ? MISSING : model - limit.lowestMidi,
      fromVariant: model === null ? MISSING : fromNearestVariant(model, limit),
    };
  });
  return {
    threshold,
    comparisons,
    rmsFromChart: rootMeanSquare(comparisons.map(({ fromChart }) => fromChart)),
    rmsFromVariant: rootMeanSquare(comparisons.map(({ fromVariant }) => fromVariant)),
  };
}

/** @returns the one threshold with which the model comes nearest to the chart */
export function fitThreshold(curves: readonly LimitCurve[]): LimitFit {
  let best = compareLimits(curves, Math.exp(LOWEST_LOG));
  for (let i = 1; i <= LOG_STEPS; i += 1) {
    const fit = compareLimits(curves, Math.exp(LOWEST_LOG + i * LOG_STEP));
    if (limitCost(fit) < limitCost(best)) best = fit;
  }
  return best;
}

/**
 * What the other intervals predict for each one: the threshold is fitted without it.
 * @returns semitones from the nearest published variant, in the order of the curves
 */
export function leaveOneOut(curves: readonly LimitCurve[]): readonly LimitComparison[] {
  return curves.flatMap((curve) => {
    const { threshold } = fitThreshold(curves.filter((other) => other !== curve));
    return compareLimits([curve], threshold).comparisons;
  });
}
