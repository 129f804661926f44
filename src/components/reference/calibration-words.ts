import { CALIBRATION_FIT } from '#shared/data/muddiness-constants';
import { MUDDY_REGISTERS, REGISTER_RATINGS } from '#shared/data/register-ratings';
import type { NoteNaming } from '#shared/pitch/display';
import type { LowIntervalLimit } from '#shared/data/low-interval-limits';
import { correlationInterval } from '#shared/voicing/calibration/statistics';
import { bandOf } from '#shared/voicing/uncertainty';
import { nearestNote, semitonesOff, type FitLine } from '@/charts/calibration-fit';

/** @returns a figure with so many decimals and a true minus sign */
export function figureText(value: number, decimals: number): string {
  return value.toFixed(decimals).replace('-', '−');
}

/** What the calibration says of its own fit. */
type CalibrationFigures = Readonly<Record<keyof typeof CALIBRATION_FIT, number>>;

/** One figure of how well the constants do, with what it means. */
export interface FitFigure {
  readonly name: string;
  readonly value: string;
  readonly means: string;
}

/** @returns how well the constants in force do */
export function fitFigures(fit: CalibrationFigures = CALIBRATION_FIT): readonly FitFigure[] {
  const semitones = (value: number) => `${figureText(value, 2)} semitones rms`;
  const rated = REGISTER_RATINGS.filter(({ register }) => register <= MUDDY_REGISTERS).length;
  const [low, high] = correlationInterval(fit.correlation, rated);
  return [
    {
      ...{ name: 'Model from the chart', value: semitones(fit.rmsFromChart) },
      means: 'one threshold for all intervals, against the chart as printed',
    },
    {
      ...{ name: 'Model from the nearest variant', value: semitones(fit.rmsFromNearestVariant) },
      means: 'nothing where the model lies within what has been published',
    },
    {
      ...{ name: 'Left out, threshold fitted anew', value: semitones(fit.rmsLeftOutThreshold) },
      means: 'each interval predicted by the others, from the nearest variant',
    },
    {
      ...{ name: 'Left out, all constants fitted anew', value: semitones(fit.rmsLeftOut) },
      means: 'the same, with every fitted constant found again without it',
    },
    {
      name: 'Correlation with listeners’ ratings',
      value: `r = ${figureText(fit.correlation, 2)}`,
      means:
        `95 % interval ${figureText(low, 2)} to ${figureText(high, 2)}, ${rated} chords: ` +
        'the muddier by the index, the less consonant to listeners',
    },
  ];
}

/** @returns the plot in a sentence, for those who cannot see it */
export function fitSummary(lines: readonly FitLine[], naming: NoteNaming): string {
  const missed = lines.flatMap((line) =>
    line.model === null ? [] : [{ line, off: line.model - line.chart }],
  );
  const [furthest] = [...missed].sort((a, b) => Math.abs(b.off) - Math.abs(a.off));
  const most = furthest
    ? ` The furthest from the chart is ${furthest.line.interval}, ${semitonesOff(furthest.off)} semitones ` +
      `from ${nearestNote(furthest.line.chart, naming)}.`
    : '';
  return `Lowest lower notes of ${lines.length} intervals: the chart, its published variants, the model, and what the other intervals predict.${most} The table below gives every figure.`;
}

/** @returns the lines of the table beside the plot */
export function fitTable(lines: readonly FitLine[], naming: NoteNaming): readonly (readonly string[])[] {
  const off = (line: FitLine, midi: number | null) =>
    midi === null ? 'no limit' : semitonesOff(midi - line.chart);
  return lines.map((line) => [
    line.interval,
    nearestNote(line.chart, naming),
    spreadText(line.spread, naming),
    line.model === null ? 'none' : nearestNote(line.model, naming),
    off(line, line.model),
    off(line, line.leftOut),
  ]);
}

/** @returns the published variants: `A1 to D♭2`, or the one note */
export function spreadText({ low, high }: LowIntervalLimit['spread'], naming: NoteNaming): string {
  const lowest = nearestNote(low, naming);
  return low === high ? lowest : `${lowest} to ${nearestNote(high, naming)}`;
}

/** @returns where an index may lie: `45 to 55` */
export function bandText(index: number): string {
  const { low, high } = bandOf(index);
  return `${Math.round(low)} to ${Math.round(high)}`;
}
