// Written by `npm run calibrate`: change the tables or the fit, not this file.
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';

export interface CalibratedLimit {
  readonly interval: string;
  readonly semitones: number;
  readonly chart: number;
  readonly model: number | null;
  readonly leftOut: number | null;
}

/** Found on 2026-12-01. */
export const CALIBRATION_DATE = '2026-12-01';

export const CALIBRATION_INPUTS: readonly string[] = [
  'shared/data/low-interval-limits',
  'shared/data/common-practice-orderings',
  'shared/data/register-ratings',
  'shared/data/score-chords',
  'shared/data/model-chords',
];

export const MUDDINESS_CONSTANTS: MuddinessConstants = {
  peakErb: 0.25,
  sharpness: 0.5,
  reachErb: 3.5,
  fusionErb: 0.0159,
  fusionStrength: 12,
  pooling: 2,
  floor: 0.027295,
  cornerHz: 105,
  slope: 2.7,
  windowSemitones: 2.09127,
  localWindowSemitones: 6.8,
  threshold: 0.0934807,
};

/** One standard deviation of ln ρ: what refits without an interval miss it by, and the variants' own spread. */
export const LOG_DENSITY_UNCERTAINTY = 0.143556;

/** How well the constants do; distances in semitones, root mean square. */
export const CALIBRATION_FIT = {
  rmsFromChart: 1.48966,
  rmsFromNearestVariant: 0.710516,
  rmsLeftOutThreshold: 0.776925,
  rmsLeftOut: 0.835526,
  correlation: -0.875508,
} as const;

/** The chart beside the model: lower notes as MIDI numbers; leftOut is what the other intervals predict. */
export const CALIBRATED_LIMITS: readonly CalibratedLimit[] = [
  { interval: 'm2', semitones: 1, chart: 52, model: 52.8659, leftOut: 53.1127 },
  { interval: 'M2', semitones: 2, chart: 51, model: 51.5935, leftOut: 51.6414 },
  { interval: 'm3', semitones: 3, chart: 48, model: 49.7935, leftOut: 49.9264 },
  { interval: 'M3', semitones: 4, chart: 46, model: 47.9161, leftOut: 48.0305 },
  { interval: 'P4', semitones: 5, chart: 46, model: 42.0883, leftOut: 41.9791 },
  { interval: 'A4/d5', semitones: 6, chart: 46, model: 44.2115, leftOut: 43.9062 },
  { interval: 'P5', semitones: 7, chart: 34, model: 33.7966, leftOut: 33.708 },
  { interval: 'm6', semitones: 8, chart: 43, model: 40.8632, leftOut: 40.8006 },
  { interval: 'M6', semitones: 9, chart: 41, model: 40.364, leftOut: 40.3577 },
  { interval: 'm7', semitones: 10, chart: 41, model: 41.0021, leftOut: 41.0295 },
  { interval: 'M7', semitones: 11, chart: 41, model: 40.8457, leftOut: 40.8371 },
  { interval: 'm9', semitones: 13, chart: 40, model: 40.0303, leftOut: 40.0639 },
  { interval: 'M9', semitones: 14, chart: 39, model: 37.8309, leftOut: 37.5926 },
  { interval: 'm10', semitones: 15, chart: 36, model: 36.2133, leftOut: 36.2411 },
  { interval: 'M10', semitones: 16, chart: 34, model: 34.5888, leftOut: 34.6386 },
];
