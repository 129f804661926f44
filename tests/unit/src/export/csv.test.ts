import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { csvOf } from '@/export/csv';
import { pairsTable, partialsTable } from '@/export/tables';
import { analysisOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

describe('a table as comma-separated values', () => {
  it('when it is written, then its example holds', () => {
    expect(csvOf({ headings: ['n', 'note'], rows: [[1, '=1+1']] })).toBe("n,note\r\n1,'=1+1");
  });

  it.each(['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\rx', '\0x'])(
    'when words begin as a formula does (%j), then a quote stands before them',
    (word) => {
      const [, row] = Papa.parse<string[]>(csvOf({ headings: ['note'], rows: [[word]] })).data;
      expect(row?.[0]?.startsWith("'")).toBe(true);
    },
  );

  it('when words hold commas, quotes and new lines, then they come back as they were', () => {
    const words = ['a,b', 'say "div."', 'one\ntwo'];
    const { data } = Papa.parse<string[]>(csvOf({ headings: ['x', 'y', 'z'], rows: [words] }));
    expect(data[1]).toEqual(words);
  });

  it('when a figure is negative, then it stays a figure', () => {
    expect(csvOf({ headings: ['level [dB]'], rows: [[-6.5]] })).toBe('level [dB]\r\n-6.5');
  });

  it('when a figure is none, then that is an error and no silent cell', () => {
    expect(() => csvOf({ headings: ['x'], rows: [[NaN]] })).toThrow(RangeError);
  });
});

describe('the tables of a chord', () => {
  const chord = chordOf('Vc C2 E2');
  const analysis = analysisOf(chord, {
    registers: { great: { index: 70, at: 38 } },
    limits: [{ lowerId: 'note-1', upperId: 'note-2', interval: 'M3', limit: 'Bb2', semitonesBelow: 10 }],
    pairs: [
      {
        ...{ lowerId: 'note-1', upperId: 'note-2', register: 'great', share: 1 },
        meetings: [{ lowerN: 1, upperN: 1, differenceHz: 17.002, share: 1 }],
      },
    ],
  });

  it('when partials are listed, then each has its number, frequency and level under the loudest', () => {
    const { headings, rows } = partialsTable(analysis);
    expect(headings).toContain('frequency [Hz]');
    expect(rows).toHaveLength(6);
    // C2 of equal temperament: 65.406 Hz; the made-up partials fall by 6 dB each.
    expect(rows.slice(0, 3).map((row) => row.slice(4, 7))).toEqual([
      [1, 65.406, 0],
      [2, 130.813, -6],
      [3, 196.219, -12],
    ]);
  });

  it('when pairs are listed, then each has its interval, its limit and its share', () => {
    const { headings, rows } = pairsTable(analysis);
    expect(rows).toEqual([['Vc', 'C2', 'Vc', 'E2', 'major third', 4, 'Bb2', 10, 100, 17]]);
    expect(headings).toHaveLength(rows[0]?.length ?? 0);
    expect(headings.at(-2)).toBe('share of the clouding in the great octave [%]');
  });

  it('when there are no notes, then there are headings and no lines', () => {
    const silent = analysisOf(chordOf('Vc C2'));
    expect(pairsTable(silent).rows).toEqual([]);
    expect(partialsTable({ ...silent, voices: [] }).rows).toEqual([]);
  });
});
