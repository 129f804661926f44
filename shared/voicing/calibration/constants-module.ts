import type { Judgement } from '#shared/voicing/calibration/judgement';
import type { LeaveOneOut } from '#shared/voicing/calibration/uncertainty';

/** Figures kept: far more than the fit can tell apart. */
const DIGITS = 6;

/**
 * The text of shared/data/muddiness-constants, as the calibration writes it.
 * @param date of the run, YYYY-MM-DD
 */
export function constantsModule(judgement: Judgement, left: LeaveOneOut, date: string): string {
  const { limits, correlation, constants } = judgement;
  const fits = limits.comparisons.map(
    ({ limit, model }, i) =>
      `  { interval: '${limit.interval}', semitones: ${limit.semitones}, chart: ${limit.lowestMidi}, model: ${figure(model)}, leftOut: ${figure(left.allConstants[i]?.model ?? null)} },`,
  );
  return `${HEAD}
/** Found on ${date}. */
export const CALIBRATION_DATE = '${date}';

export const CALIBRATION_INPUTS: readonly string[] = [
  'shared/data/low-interval-limits',
  'shared/data/common-practice-orderings',
  'shared/data/register-ratings',
  'shared/data/score-chords',
  'shared/data/model-chords',
];

export const MUDDINESS_CONSTANTS: MuddinessConstants = {
${Object.entries(constants)
  .map(([name, value]) => `  ${name}: ${figure(value)},`)
  .join('\n')}
};

/** One standard deviation of ln ρ: what refits without an interval miss it by, and the variants' own spread. */
export const LOG_DENSITY_UNCERTAINTY = ${figure(left.logUncertainty)};

/** How well the constants do; distances in semitones, root mean square. */
export const CALIBRATION_FIT = {
  rmsFromChart: ${figure(limits.rmsFromChart)},
  rmsFromNearestVariant: ${figure(limits.rmsFromVariant)},
  rmsLeftOutThreshold: ${figure(left.rmsThresholdOnly)},
  rmsLeftOut: ${figure(left.rmsAllConstants)},
  correlation: ${figure(correlation)},
} as const;

/** The chart beside the model: lower notes as MIDI numbers; leftOut is what the other intervals predict. */
export const CALIBRATED_LIMITS: readonly CalibratedLimit[] = [
${fits.join('\n')}
];
`;
}

const HEAD = `// Written by \`npm run calibrate\`: change the tables or the fit, not this file.
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';

export interface CalibratedLimit {
  readonly interval: string;
  readonly semitones: number;
  readonly chart: number;
  readonly model: number | null;
  readonly leftOut: number | null;
}
`;

function figure(value: number | null): string {
  return value === null ? 'null' : String(Number(value.toPrecision(DIGITS)));
}
