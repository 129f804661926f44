import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import type { Semitones } from '#shared/units';
import type { Untuned } from '#shared/voicing/calibration/judgement';
import { fitConstants, REFIT } from '#shared/voicing/calibration/fit';
import type { LimitCurve } from '#shared/voicing/calibration/limit-curves';
import { limitCurves } from '#shared/voicing/calibration/limit-curves';
import { mean, rootMeanSquare } from '#shared/voicing/calibration/statistics';
import type { LimitComparison } from '#shared/voicing/calibration/threshold';
import { compareLimits, leaveOneOut } from '#shared/voicing/calibration/threshold';
import { CALIBRATION_A4 } from '#shared/voicing/calibration/yardsticks';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import { muddinessModel } from '#shared/voicing/muddiness/model';
import { AXIS_STEP } from '#shared/voicing/muddiness/models';

/** One interval as the others predict it. */
export interface Prediction extends LimitComparison {
  /** How far ρ at the nearest published variant lies from the threshold, natural logarithm. */
  readonly logError: number;
}

export interface LeaveOneOut {
  /** The threshold alone fitted anew without each interval. */
  readonly thresholdOnly: readonly LimitComparison[];
  /** All constants fitted anew without each interval. */
  readonly allConstants: readonly Prediction[];
  readonly rmsThresholdOnly: Semitones;
  readonly rmsAllConstants: Semitones;
  /** One standard deviation of ln ρ: what the refits miss by, and the published variants' own spread. */
  readonly logUncertainty: number;
}

/** A figure anywhere in a range with equal likelihood has a variance of a twelfth of its square. */
const UNIFORM = 12;

/**
 * Leaves each interval out in turn and lets the others predict it.
 * @param constants the whole fit's
 * @param progress is told each interval's name
 */
export function leaveEachOut(
  constants: MuddinessConstants,
  progress: (interval: string) => void = () => undefined,
): LeaveOneOut {
  const curves = curvesOf(constants);
  const thresholdOnly = leaveOneOut(curves);
  const allConstants = LOW_INTERVAL_LIMITS.flatMap((limit) => {
    progress(limit.interval);
    const rest = LOW_INTERVAL_LIMITS.filter((other) => other !== limit);
    const { judgement } = fitConstants(constants, REFIT, rest);
    return predictionsOf(curvesOf(judgement.constants, [limit]), judgement.constants.threshold);
  });
  const spreads = curves.map((curve) => logSpread(curve));
  const errors = allConstants.map(({ logError }) => logError);
  return {
    thresholdOnly,
    allConstants,
    rmsThresholdOnly: rootMeanSquare(thresholdOnly.map(({ fromVariant }) => fromVariant)),
    rmsAllConstants: rootMeanSquare(allConstants.map(({ fromVariant }) => fromVariant)),
    logUncertainty: Math.sqrt(
      mean(errors.map((error) => error ** 2)) + mean(spreads.map((spread) => spread ** 2)) / UNIFORM,
    ),
  };
}

function curvesOf(constants: Untuned, limits = LOW_INTERVAL_LIMITS): readonly LimitCurve[] {
  return limitCurves(muddinessModel({ ...constants, threshold: 1 }, CALIBRATION_A4, AXIS_STEP), limits);
}

function predictionsOf(curves: readonly LimitCurve[], threshold: number): readonly Prediction[] {
  const { comparisons } = compareLimits(curves, threshold);
  return comparisons.map((comparison, i) => {
    const { low, high } = comparison.limit.spread;
    const nearest = Math.min(Math.max(comparison.model ?? high, low), high);
    return { ...comparison, logError: logDensityAt(curves[i], nearest) - Math.log(threshold) };
  });
}

/** How much ln ρ changes from the lowest to the highest published variant. */
function logSpread(curve: LimitCurve): number {
  return logDensityAt(curve, curve.limit.spread.low) - logDensityAt(curve, curve.limit.spread.high);
}

function logDensityAt(curve: LimitCurve | undefined, midi: number): number {
  const place = midi - (curve?.lowest ?? 0);
  const below = Math.floor(place);
  const a = curve?.logDensity[below] ?? 0;
  const b = curve?.logDensity[below + 1] ?? a;
  return a + (place - below) * (b - a);
}
