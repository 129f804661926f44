import { describe, expect, it } from 'vitest';
import { LOW_INTERVAL_LIMITS, type LowIntervalLimit } from '#shared/data/low-interval-limits';
import { CALIBRATED_LIMITS } from '#shared/data/muddiness-constants';
import {
  calibrationData,
  calibrationOptions,
  fitLines,
  fitText,
  semitonesOff,
} from '@/charts/calibration-fit';

const colours = { ink: '#000000', quiet: '#777777', line: '#cccccc', surface: '#ffffff' };
const limits: readonly LowIntervalLimit[] = [
  { interval: 'M3', semitones: 4, lowest: 'Bb2', lowestMidi: 46, spread: { low: 45, high: 47 } },
  { interval: 'P5', semitones: 7, lowest: 'Bb1', lowestMidi: 34, spread: { low: 34, high: 34 } },
];
const lines = fitLines(limits, [
  { interval: 'P5', semitones: 7, chart: 34, model: null, leftOut: 37.9 },
  { interval: 'M3', semitones: 4, chart: 46, model: 47.6, leftOut: 45.8 },
]);

describe('the plot of the fit', () => {
  it('when chart and calibration meet, then every interval finds its own, in whatever order', () => {
    expect(lines.map(({ interval, chart, model, leftOut }) => [interval, chart, model, leftOut])).toEqual([
      ['M3', 46, 47.6, 45.8],
      ['P5', 34, null, 37.9],
    ]);
  });

  it('when it is drawn, then model, prediction, chart and spread stand over their interval', () => {
    const sets = calibrationData(lines, colours).datasets.map(({ data }) => data.map(({ x, y }) => [x, y]));
    expect(sets[0]).toEqual([[0, 47.6]]);
    expect(sets[1]).toEqual([
      [0, 45.8],
      [1, 37.9],
    ]);
    expect(sets[2]).toEqual([
      [0, 46],
      [1, 34],
    ]);
    expect(sets[3]?.slice(0, 3)).toEqual([
      [0, 45],
      [0, 47],
      [NaN, NaN],
    ]);
  });

  it('when the scales are set, then every figure lies within them and the axes are titled', () => {
    const { scales } = calibrationOptions(lines, colours, 'english');
    expect(Number(scales?.y?.min)).toBeLessThan(34);
    expect(Number(scales?.y?.max)).toBeGreaterThan(47.6);
    expect(scales?.x).toMatchObject({ min: -0.5, max: 1.5, title: { text: 'Interval' } });
    expect(scales?.y).toMatchObject({ title: { text: 'Lower note [pitch]' } });
  });

  it('when an interval is told, then its differences are signed and a missing limit is said', () => {
    expect(lines.map((line) => fitText(line, 'english'))).toEqual([
      [
        'M3: chart B♭2, published variants A2 to B2',
        'model +1.6 semitones from the chart',
        'predicted by the others −0.2 semitones from the chart',
      ],
      [
        'P5: chart B♭1, published variants alike',
        'model no limit',
        'predicted by the others +3.9 semitones from the chart',
      ],
    ]);
    expect(semitonesOff(-0.04)).toBe('0.0');
  });

  it('when the calibration in force is plotted, then each of the fifteen intervals has its model and prediction', () => {
    const inForce = fitLines(LOW_INTERVAL_LIMITS, CALIBRATED_LIMITS);
    expect(inForce).toHaveLength(15);
    for (const { model, leftOut } of inForce) {
      expect(model).toEqual(expect.any(Number));
      expect(leftOut).toEqual(expect.any(Number));
    }
  });
});
