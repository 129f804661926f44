import { MUDDY_REGISTERS, REGISTER_RATINGS } from '#shared/data/register-ratings';
import type { CostParts } from '#shared/voicing/calibration/cost';
import { costParts } from '#shared/voicing/calibration/cost';
import type { DealtChords } from '#shared/voicing/calibration/dealt-chords';
import type { Judgement } from '#shared/voicing/calibration/judgement';
import { correlationInterval, mean } from '#shared/voicing/calibration/statistics';
import type { LeaveOneOut } from '#shared/voicing/calibration/uncertainty';

const DIGITS = 2;
const PERCENT = 100;
const NAME_WIDTH = 8;
const FIGURE_WIDTH = 10;

/** @returns the fit in lines of text: limit by limit, then every other yardstick */
export function calibrationReport(judgement: Judgement, left: LeaveOneOut): readonly string[] {
  return [
    ...limitLines(judgement, left),
    '',
    ...summaryLines(judgement, left),
    '',
    ...chordLines(judgement),
    '',
    ...costLines(costParts(judgement)),
  ];
}

function limitLines({ limits }: Judgement, left: LeaveOneOut): readonly string[] {
  const head = ['interval', 'chart', 'model', 'off chart', 'off variant', 'left out'];
  const lines = limits.comparisons.map(({ limit, model, fromChart, fromVariant }, i) => [
    limit.interval,
    String(limit.lowestMidi),
    model === null ? 'none' : model.toFixed(DIGITS),
    fromChart.toFixed(DIGITS),
    fromVariant.toFixed(DIGITS),
    (left.allConstants[i]?.fromVariant ?? NaN).toFixed(DIGITS),
  ]);
  return [head, ...lines].map(([name = '', ...figures]) =>
    [name.padEnd(NAME_WIDTH), ...figures.map((figure) => figure.padStart(FIGURE_WIDTH + 2))].join(''),
  );
}

function summaryLines({ limits, correlation, constants }: Judgement, left: LeaveOneOut): readonly string[] {
  const points = REGISTER_RATINGS.filter(({ register }) => register <= MUDDY_REGISTERS).length;
  const [low, high] = correlationInterval(correlation, points);
  return [
    `from the chart        ${limits.rmsFromChart.toFixed(DIGITS)} semitones rms`,
    `from nearest variant  ${limits.rmsFromVariant.toFixed(DIGITS)} semitones rms`,
    `left out, threshold   ${left.rmsThresholdOnly.toFixed(DIGITS)} semitones rms from the nearest variant`,
    `left out, all         ${left.rmsAllConstants.toFixed(DIGITS)} semitones rms from the nearest variant`,
    `ratings               r = ${correlation.toFixed(DIGITS + 1)} (95 %: ${low.toFixed(DIGITS)} to ${high.toFixed(DIGITS)}, ${points} chords)`,
    `uncertainty of ln ρ   ${left.logUncertainty.toFixed(DIGITS + 1)} (one standard deviation)`,
    ...Object.entries(constants).map(([name, value]) => `${name.padEnd(22)}${value}`),
  ];
}

function list(values: readonly number[]): string {
  return values.map((value) => value.toFixed(0)).join(' ');
}

function dealtLines({ fifths, octaves, open, score, close, passing }: DealtChords): readonly string[] {
  return [
    'dealt from the bottom with the basses:',
    `  fifths                 ${list(fifths)}`,
    `  octaves                ${list(octaves)}`,
    `  open chords            ${list(open)}`,
    `  score chords           ${list(score)}`,
    `  close low chords       ${list(close)}`,
    `  passing a limit        ${list(passing)}`,
  ];
}

function chordLines(judgement: Judgement): readonly string[] {
  return [
    `orderings, least margin  ${Math.min(...judgement.orderings).toFixed(DIGITS)} (1 is what must hold)`,
    `score chords             ${list(judgement.scoreChords)}`,
    `open chords              ${list(judgement.openChords)}, mean ${mean(judgement.openChords).toFixed(0)}`,
    `close low chords         ${list(judgement.closeChords)}`,
    `chords passing a limit   ${list(judgement.passingChords)}`,
    ...dealtLines(judgement.dealt),
    `C4 E4 G4, C3 E3 G3       ${judgement.clearTriad.toFixed(DIGITS)}, ${judgement.middleTriad.toFixed(DIGITS)}`,
    `from ppp to fff          ${judgement.dynamicsMove.toFixed(DIGITS)} points`,
    `octave lower, clearer    ${(judgement.largestRipple * PERCENT).toFixed(DIGITS)} % at most`,
  ];
}

function costLines(parts: CostParts): readonly string[] {
  return Object.entries(parts).map(
    ([name, value]: [string, number]) => `cost of ${name.padEnd(10)} ${value.toFixed(DIGITS + 2)}`,
  );
}
