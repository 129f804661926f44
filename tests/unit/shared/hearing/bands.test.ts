import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { ZWICKER_BANDS } from '#shared/data/critical-bands';
import { erbAt, erbRate } from '#shared/hearing/erb';
import { levelOfPhon, phonOfLevel } from '#shared/hearing/iso-226-2003';
import { thresholdInQuiet } from '#shared/hearing/terhardt-1979';
import { traunmuller1990 } from '#shared/hearing/traunmuller-1990';
import { bandOf } from '#shared/hearing/zwicker-1961';
import { criticalBandRate, criticalBandwidth } from '#shared/hearing/zwicker-terhardt-1980';
import { input, numberOf, numbersOf, publishedRows, toleranceOf } from '../../../support/published';

describe.each<[string, (frequencyHz: number) => number]>([
  ['erb.', erbAt],
  ['erbrate.', erbRate],
  ['traun.', traunmuller1990],
  ['zt80.bark', criticalBandRate],
  ['zt80.cb', criticalBandwidth],
  ['tq.', thresholdInQuiet],
])('what hearing does at a frequency, %s', (prefix, measure) => {
  it.each(publishedRows('hearing', prefix).map((row) => [row.id, row] as const))(
    'when %s is asked for, then the published value comes out',
    (_, row) => {
      const value = measure(input(row, 'f', z.number()));
      expect(Math.abs(value - numberOf(row))).toBeLessThanOrEqual(toleranceOf(row));
    },
  );
});

describe('critical bands', () => {
  it.each(publishedRows('hearing', 'bark.').map((row) => [row.id, row] as const))(
    'when the band %s is looked up by its centre, then edges, centre and width are the published ones',
    (_, row) => {
      const [low, centre = 0, high, width] = numbersOf(row);
      const band = bandOf(centre);
      expect(band?.bark).toBe(input(row, 'bark', z.number()));
      expect([band?.lowHz, band?.centreHz, band?.highHz]).toEqual([low, centre, high]);
      expect((band?.highHz ?? 0) - (band?.lowHz ?? 0)).toBe(width);
    },
  );

  it('when the bands are read in order, then each begins where the one before ends', () => {
    expect(ZWICKER_BANDS).toHaveLength(24);
    ZWICKER_BANDS.slice(1).forEach((band, i) => expect(band.lowHz).toBe(ZWICKER_BANDS[i]?.highHz));
  });

  it('when a frequency lies above the last band, then it is in none', () => {
    expect(bandOf(16_000)).toBeNull();
  });
});

describe('equal loudness', () => {
  const rows = publishedRows('hearing', 'iso226.');

  it.each(rows.map((row) => [row.id, row] as const))(
    'when the level of %s is asked for, then the contour of ISO 226:2003 comes out, there and back',
    (_, row) => {
      const phon = input(row, 'phon', z.number());
      const frequency = input(row, 'f', z.number());
      const level = levelOfPhon(phon, frequency);
      expect(Math.abs(level - numberOf(row))).toBeLessThanOrEqual(toleranceOf(row));
      expect(phonOfLevel(level, frequency)).toBeCloseTo(phon, 6);
    },
  );

  it('when a frequency lies between two of the table, then its level lies between theirs', () => {
    const level = levelOfPhon(40, 90);
    expect(level).toBeLessThan(levelOfPhon(40, 80));
    expect(level).toBeGreaterThan(levelOfPhon(40, 100));
  });

  it('when a frequency lies outside the table, then it is refused', () => {
    expect(() => levelOfPhon(40, 15)).toThrow(RangeError);
    expect(() => levelOfPhon(40, 13_000)).toThrow(RangeError);
  });
});
