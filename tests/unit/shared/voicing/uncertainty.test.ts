import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { LOG_DENSITY_UNCERTAINTY } from '#shared/data/muddiness-constants';
import { densityOfIndex, indexOf } from '#shared/voicing/muddiness/scores';
import { bandOf, differClearly, uncertaintyOf } from '#shared/voicing/uncertainty';

const indices = fc.double({ min: 0, max: 100, noNaN: true });

describe('the band of an index', () => {
  it('when any index is given, then its band holds it and stays within 0 and 100', () => {
    fc.assert(
      fc.property(indices, (index) => {
        const { low, high } = bandOf(index);
        expect(low).toBeLessThanOrEqual(index + 1e-9);
        expect(high).toBeGreaterThanOrEqual(index - 1e-9);
        expect(low).toBeGreaterThanOrEqual(0);
        expect(high).toBeLessThanOrEqual(100);
      }),
    );
  });

  it('when the index is 50, then the band is what ρ a factor lower and higher gives', () => {
    // ρ = T at 50: 100 (1 − 2^(−e^±u)), by hand.
    const { low, high } = bandOf(50);
    expect(low).toBeCloseTo(100 * (1 - 2 ** -Math.exp(-LOG_DENSITY_UNCERTAINTY)), 9);
    expect(high).toBeCloseTo(100 * (1 - 2 ** -Math.exp(LOG_DENSITY_UNCERTAINTY)), 9);
    expect(uncertaintyOf(50)).toBeGreaterThan(2);
    expect(uncertaintyOf(50)).toBeLessThan(10);
  });

  it('when the index is 0, then it is certain', () => {
    expect(uncertaintyOf(0)).toBe(0);
  });
});

describe('a clear difference', () => {
  it('when two figures are alike or nearly, then there is none; far apart there is; either way round', () => {
    expect(differClearly(50, 50)).toBe(false);
    expect(differClearly(50, 51)).toBe(false);
    expect(differClearly(50, 75)).toBe(true);
    fc.assert(
      fc.property(indices, indices, (a, b) => {
        expect(differClearly(a, b)).toBe(differClearly(b, a));
      }),
    );
  });

  it('when something is compared with nothing, then the difference is clear', () => {
    expect(differClearly(0, 20)).toBe(true);
    expect(differClearly(0, 0)).toBe(false);
  });
});

describe('index and density', () => {
  it('when the density is the threshold, then the index is 50, and each threshold more halves what is left', () => {
    expect(indexOf(0.2, 0.2)).toBe(50);
    expect(indexOf(0.4, 0.2)).toBe(75);
    expect(indexOf(0, 0.2)).toBe(0);
  });

  it('when an index is turned back, then its density comes out', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 3, noNaN: true }), (density) => {
        expect(densityOfIndex(indexOf(density, 0.2), 0.2)).toBeCloseTo(density, 6);
      }),
    );
    expect(Number.isFinite(densityOfIndex(100, 0.2))).toBe(true);
  });
});
