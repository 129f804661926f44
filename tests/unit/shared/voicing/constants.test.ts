import { describe, expect, it } from 'vitest';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import {
  CALIBRATED_LIMITS,
  CALIBRATION_DATE,
  CALIBRATION_FIT,
  CALIBRATION_INPUTS,
  MUDDINESS_CONSTANTS,
} from '#shared/data/muddiness-constants';
import { FITTED, START } from '#shared/voicing/calibration/fit';
import { constantsModule } from '#shared/voicing/calibration/constants-module';
import { limitCurves } from '#shared/voicing/calibration/limit-curves';
import { compareLimits } from '#shared/voicing/calibration/threshold';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import { muddinessModel } from '#shared/voicing/muddiness/model';

const TEN_PERCENT = 1.1;

/** How far the fit of some constants lies from the one that was printed with those in force, semitones. */
function offPrintedFit(constants: MuddinessConstants): number {
  const curves = limitCurves(muddinessModel(constants, 440, 0.5), LOW_INTERVAL_LIMITS);
  const { comparisons } = compareLimits(curves, constants.threshold);
  return Math.max(
    ...comparisons.map(({ model }, i) =>
      Math.abs((model ?? Infinity) - (CALIBRATED_LIMITS[i]?.model ?? NaN)),
    ),
  );
}

describe('the constants in force', () => {
  it('when the limits are found anew, then they are those that the calibration printed', () => {
    expect(offPrintedFit(MUDDINESS_CONSTANTS)).toBeLessThan(0.001);
  });

  it.each([...FITTED, 'sharpness', 'threshold'] as const)(
    'when %s is moved by 10 %, then the limits are no longer those',
    (name) => {
      const moved = { ...MUDDINESS_CONSTANTS, [name]: MUDDINESS_CONSTANTS[name] * TEN_PERCENT };
      expect(offPrintedFit(moved)).toBeGreaterThan(0.001);
    },
  );

  it('when the form’s own constants are read, then the fit has left them as it began', () => {
    for (const name of ['sharpness', 'pooling', 'reachErb'] as const) {
      expect(MUDDINESS_CONSTANTS[name]).toBe(START[name]);
    }
  });

  it('when the file is read, then it says when and from what it was made, and how well it fits', () => {
    expect(CALIBRATION_DATE).toMatch(/^\d{4}-\d{2}-\d{2}$/);
    expect(CALIBRATION_INPUTS).toContain('shared/data/low-interval-limits');
    expect(CALIBRATED_LIMITS.map(({ chart }) => chart)).toEqual(
      LOW_INTERVAL_LIMITS.map(({ lowestMidi }) => lowestMidi),
    );
    expect(CALIBRATION_FIT.rmsFromNearestVariant).toBeLessThanOrEqual(0.8);
  });
});

describe('the file of constants', () => {
  it('when a calibration is written, then its text holds the date, each constant and each limit', () => {
    const [limit] = LOW_INTERVAL_LIMITS;
    if (!limit) throw new Error('no limits');
    const comparison = { limit, model: 52.5, fromChart: 0.5, fromVariant: 0.5, logError: 0 };
    const judgement = {
      constants: MUDDINESS_CONSTANTS,
      limits: { threshold: 0.1, comparisons: [comparison], rmsFromChart: 0.5, rmsFromVariant: 0.5 },
      orderings: [],
      correlation: -0.9,
      scoreChords: [],
      openChords: [],
      closeChords: [],
      passingChords: [],
      dealt: { fifths: [], octaves: [], open: [], score: [], close: [], passing: [] },
      clearTriad: 1,
      middleTriad: 30,
      dynamicsMove: 0,
      largestRipple: 0,
    };
    const left = {
      thresholdOnly: [comparison],
      allConstants: [{ ...comparison, model: null }],
      rmsThresholdOnly: 0.6,
      rmsAllConstants: 0.7,
      logUncertainty: 0.15,
    };
    const text = constantsModule(judgement, left, '2030-02-03');
    expect(text).toContain("CALIBRATION_DATE = '2030-02-03'");
    expect(text).toContain(`peakErb: ${Number(MUDDINESS_CONSTANTS.peakErb.toPrecision(6))},`);
    expect(text).toContain("{ interval: 'm2', semitones: 1, chart: 52, model: 52.5, leftOut: null },");
    expect(text).toContain('LOG_DENSITY_UNCERTAINTY = 0.15;');
    expect(text).toContain('correlation: -0.9,');
  });
});
