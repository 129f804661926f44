import { describe, expect, it } from 'vitest';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import {
  CALIBRATED_LIMITS,
  CALIBRATION_FIT,
  CALIBRATION_INPUTS,
  MUDDINESS_CONSTANTS,
} from '#shared/data/muddiness-constants';
import { fitLines } from '@/charts/calibration-fit';
import { calibrationInputs } from '@/components/reference/calibration-inputs';
import { bandText, fitFigures, fitSummary, fitTable } from '@/components/reference/calibration-words';
import { constantsInForce } from '@/components/reference/constants-in-force';
import { figureDefinitions } from '@/components/reference/figure-definitions';
import {
  bodiesTable,
  levelsTables,
  limitsTable,
  rangesTable,
  registersTable,
  sizesTable,
} from '@/components/reference/reference-tables';

const lines = fitLines(LOW_INTERVAL_LIMITS, CALIBRATED_LIMITS);

describe('the fit in words', () => {
  it('when the table is printed, then the rms that is printed beside it follows from its differences', () => {
    const off = fitTable(lines, 'english').map(([, , , , difference = '']) =>
      Number(difference.replace('−', '-').replace('+', '')),
    );
    const rms = Math.sqrt(off.reduce((sum, value) => sum + value ** 2, 0) / off.length);
    expect(rms).toBeCloseTo(CALIBRATION_FIT.rmsFromChart, 1);
    expect(fitFigures()[0]?.value).toBe(`${CALIBRATION_FIT.rmsFromChart.toFixed(2)} semitones rms`);
  });

  it('when a correlation is given, then with the 95 % interval of Fisher’s transformation', () => {
    const figure = fitFigures({ ...CALIBRATION_FIT, correlation: -0.8 });
    // 14 chords: tanh(atanh(0.8) ± 1.96 / √11) is 0.47 to 0.93.
    expect(figure.at(-1)?.means).toContain('−0.93 to −0.47, 14 chords');
  });

  it('when the plot is told, then the interval furthest from the chart is named', () => {
    const [third, fifth] = [lines[3], lines[6]];
    if (!third || !fifth) throw new Error('the chart has fifteen lines');
    const told = fitSummary(
      [
        { ...third, model: third.chart + 1 },
        { ...fifth, model: fifth.chart - 2.5 },
      ],
      'english',
    );
    expect(told).toContain('P5, −2.5 semitones from B♭1');
  });

  it('when an index of 50 has its band told, then 50 lies within', () => {
    const [low = NaN, high = NaN] = bandText(50).split(' to ').map(Number);
    expect(low).toBeLessThan(50);
    expect(high).toBeGreaterThan(50);
  });
});

describe('the constants as shown', () => {
  it('when they are listed, then each constant of the index stands there once, with what it does', () => {
    const shown = constantsInForce();
    expect(shown.map(({ value }) => value).sort()).toEqual(Object.values(MUDDINESS_CONSTANTS).sort());
    for (const { name, does } of shown) expect(`${name}: ${does}`).not.toBe(': ');
  });

  it('when a table of the calibration is named, then with its source, none by its place alone', () => {
    for (const [name, source] of calibrationInputs(CALIBRATION_INPUTS)) {
      expect(name).not.toContain('/');
      expect(source).not.toBe('');
    }
    expect(calibrationInputs(['shared/data/new-table'])).toEqual([['shared/data/new-table', '']]);
  });
});

describe('the tables', () => {
  it('when they are printed, then every line has a cell for every column', () => {
    const tables = [
      ...[
        limitsTable('english'),
        rangesTable('english'),
        sizesTable(),
        bodiesTable(),
        registersTable('english'),
      ],
      ...levelsTables(),
    ];
    for (const { caption, columns, lines: printed } of tables) {
      expect(printed.length, caption).toBeGreaterThan(0);
      for (const line of printed) expect(line, caption).toHaveLength(columns.length);
    }
  });

  it('when limits are printed, then as in the chart of Lowell & Pullig with its spread', () => {
    const find = (interval: string) => limitsTable('english').lines.find(([name]) => name === interval);
    expect(find('M3')).toEqual(['M3', '4', 'B♭2', 'A2 to B2']);
    expect(find('P5')).toEqual(['P5', '7', 'B♭1', 'A1 to D♭2']);
  });

  it('when registers are printed, then each runs from C to B, and the highest to E8', () => {
    const { lines: registers } = registersTable('english');
    expect(registers.find(([name]) => name === 'great')).toEqual(['great', 'C2', 'B2']);
    expect(registers.at(-1)).toEqual(['three-line and up', 'C6', 'E8']);
  });

  it('when a figure is from memory, then it is marked', () => {
    const violin = bodiesTable().lines[0]?.join(' ');
    const bass = bodiesTable().lines.at(-1)?.slice(1);
    expect(violin).not.toContain('†');
    for (const cell of bass ?? ['']) expect(cell).toContain('†');
  });

  it('when a figure is defined, then it has a unit and a source', () => {
    for (const { name, unit, source, definition } of figureDefinitions()) {
      expect(
        [name, unit, source, definition].every((text) => text !== ''),
        name,
      ).toBe(true);
    }
    // (7 + 9 / 2) / 1.5 for C2 G2 E3.
    expect(figureDefinitions().find(({ name }) => name === 'Openness')?.definition).toContain(
      '7.7 semitones',
    );
  });
});
