import { describe, expect, it } from 'vitest';
import { estimatedRoot, rootAmbiguity, rootSupports, SUPPORTS_1988 } from '#shared/hearing/parncutt-1988';
import {
  input,
  numberList,
  numberOf,
  numbersOf,
  publishedRows,
  toleranceOf,
} from '../../../support/published';

describe('roots after Parncutt', () => {
  it.each(publishedRows('roots', 'parn88.amb.v1').map((row) => [row.id, row] as const))(
    'when the 1988 weights judge %s, then the printed ambiguity comes out',
    (_, row) => {
      const value = rootAmbiguity(input(row, 'pcs', numberList), SUPPORTS_1988);
      expect(Math.abs(value - numberOf(row))).toBeLessThanOrEqual(toleranceOf(row));
    },
  );

  it.each(publishedRows('roots', 'parn88.amb.v2').map((row) => [row.id, row] as const))(
    'when the 2006 weights judge %s, then the published ambiguity comes out',
    (_, row) => {
      const value = rootAmbiguity(input(row, 'pcs', numberList));
      expect(Math.abs(value - numberOf(row))).toBeLessThanOrEqual(toleranceOf(row));
    },
  );

  it.each(publishedRows('roots', 'dcd.parn88').map((row) => [row.id, row] as const))(
    'when the chord of %s is judged, then the data set gives the same ambiguity',
    (_, row) => {
      const value = rootAmbiguity(input(row, 'midi', numberList));
      expect(Math.abs(value - numberOf(row))).toBeLessThanOrEqual(toleranceOf(row));
    },
  );

  it.each(publishedRows('roots', 'parn88.w.').map((row) => [row.id, row] as const))(
    'when the twelve roots of %s are weighed, then the published weights come out',
    (_, row) => {
      expect(rootSupports(input(row, 'pcs', numberList))).toEqual(numbersOf(row));
    },
  );

  it.each(publishedRows('roots', 'parn88.root').map((row) => [row.id, row] as const))(
    'when the root of %s is sought, then the published one comes out',
    (_, row) => {
      expect(estimatedRoot(input(row, 'pcs', numberList))).toBe(numberOf(row));
    },
  );

  it('when there are no notes, then there is no root', () => {
    expect(estimatedRoot([])).toBeNull();
    expect(rootAmbiguity([])).toBe(0);
  });
});
