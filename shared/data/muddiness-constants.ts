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
  peakErb: 0.246305,
  sharpness: 0.5,
  reachErb: 3.5,
  fusionErb: 0.015,
  fusionStrength: 12,
  pooling: 2,
  floor: 0.0251875,
  cornerHz: 105,
  slope: 2.7,
  windowSemitones: 2.4,
  localWindowSemitones: 6.8,
  threshold: 0.0934807,
};

/** One standard deviation of ln ρ: what refits without an interval miss it by, and the variants' own spread. */
export const LOG_DENSITY_UNCERTAINTY = 0.143025;

/** How well the constants do; distances in semitones, root mean square. */
export const CALIBRATION_FIT = {
  rmsFromChart: 1.49111,
  rmsFromNearestVariant: 0.707288,
  rmsLeftOutThreshold: 0.772207,
  rmsLeftOut: 0.825089,
  correlation: -0.877287,
} as const;

/** The chart beside the model: lower notes as MIDI numbers; leftOut is what the other intervals predict. */
export const CALIBRATED_LIMITS: readonly CalibratedLimit[] = [
  { interval: 'm2', semitones: 1, chart: 52, model: 52.8889, leftOut: 53.1341 },
  { interval: 'M2', semitones: 2, chart: 51, model: 51.6032, leftOut: 51.6539 },
  { interval: 'm3', semitones: 3, chart: 48, model: 49.7359, leftOut: 49.8433 },
  { interval: 'M3', semitones: 4, chart: 46, model: 47.8252, leftOut: 48.0127 },
  { interval: 'P4', semitones: 5, chart: 46, model: 42.0803, leftOut: 42.0278 },
  { interval: 'A4/d5', semitones: 6, chart: 46, model: 44.1238, leftOut: 43.9394 },
  { interval: 'P5', semitones: 7, chart: 34, model: 33.948, leftOut: 33.948 },
  { interval: 'm6', semitones: 8, chart: 43, model: 40.7791, leftOut: 40.686 },
  { interval: 'M6', semitones: 9, chart: 41, model: 40.3108, leftOut: 40.3157 },
  { interval: 'm7', semitones: 10, chart: 41, model: 41.0007, leftOut: 40.9694 },
  { interval: 'M7', semitones: 11, chart: 41, model: 40.8736, leftOut: 40.7794 },
  { interval: 'm9', semitones: 13, chart: 40, model: 40.0717, leftOut: 40.0361 },
  { interval: 'M9', semitones: 14, chart: 39, model: 37.9228, leftOut: 37.634 },
  { interval: 'm10', semitones: 15, chart: 36, model: 36.2081, leftOut: 36.2609 },
  { interval: 'M10', semitones: 16, chart: 34, model: 34.5779, leftOut: 34.6569 },
];
