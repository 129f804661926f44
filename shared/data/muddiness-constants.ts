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
  peakErb: 0.177379,
  sharpness: 0.5,
  reachErb: 3.5,
  fusionErb: 0.0518656,
  fusionStrength: 8.30463,
  pooling: 1.5,
  floor: 0.166049,
  cornerHz: 115,
  slope: 3.91155,
  windowSemitones: 2.75,
  localWindowSemitones: 3.4,
  threshold: 0.075774,
};

/** One standard deviation of ln ρ: what refits without an interval miss it by, and the variants' own spread. */
export const LOG_DENSITY_UNCERTAINTY = 0.149844;

/** How well the constants do; distances in semitones, root mean square. */
export const CALIBRATION_FIT = {
  rmsFromChart: 0.777287,
  rmsFromNearestVariant: 0.496881,
  rmsLeftOutThreshold: 0.509425,
  rmsLeftOut: 0.669526,
  correlation: -0.882506,
} as const;

/** The chart beside the model: lower notes as MIDI numbers; leftOut is what the other intervals predict. */
export const CALIBRATED_LIMITS: readonly CalibratedLimit[] = [
  { interval: 'm2', semitones: 1, chart: 52, model: 52.7531, leftOut: 53.0152 },
  { interval: 'M2', semitones: 2, chart: 51, model: 50.9501, leftOut: 50.9138 },
  { interval: 'm3', semitones: 3, chart: 48, model: 49.3363, leftOut: 49.3363 },
  { interval: 'M3', semitones: 4, chart: 46, model: 47.635, leftOut: 47.6937 },
  { interval: 'P4', semitones: 5, chart: 46, model: 45.1888, leftOut: 45.1337 },
  { interval: 'A4/d5', semitones: 6, chart: 46, model: 45.3705, leftOut: 44.9567 },
  { interval: 'P5', semitones: 7, chart: 34, model: 34.073, leftOut: 37.9256 },
  { interval: 'm6', semitones: 8, chart: 43, model: 42.6885, leftOut: 42.6882 },
  { interval: 'M6', semitones: 9, chart: 41, model: 40.1899, leftOut: 40.2056 },
  { interval: 'm7', semitones: 10, chart: 41, model: 40.1052, leftOut: 39.9661 },
  { interval: 'M7', semitones: 11, chart: 41, model: 40.5654, leftOut: 40.4776 },
  { interval: 'm9', semitones: 13, chart: 40, model: 40.0221, leftOut: 39.9916 },
  { interval: 'M9', semitones: 14, chart: 39, model: 38.2268, leftOut: 37.9579 },
  { interval: 'm10', semitones: 15, chart: 36, model: 36.77, leftOut: 36.8141 },
  { interval: 'M10', semitones: 16, chart: 34, model: 34.2007, leftOut: 34.2362 },
];
