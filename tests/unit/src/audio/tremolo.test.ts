import { describe, expect, it } from 'vitest';
import { strokesFor } from '@/audio/tremolo';

describe('strokesFor', () => {
  const { base, real, imag, ratesHz } = strokesFor(5);
  const levels = Array.from({ length: 1000 }, (_, index) =>
    real.reduce(
      (sum, cos, n) =>
        sum +
        cos * Math.cos((2 * Math.PI * n * index) / 1000) +
        (imag[n] ?? 0) * Math.sin((2 * Math.PI * n * index) / 1000),
      base,
    ),
  );

  it('when strokes follow each other, then the mean energy of a note stays as plotted', () => {
    expect(levels.reduce((sum, level) => sum + level ** 2, 0) / levels.length).toBeCloseTo(1, 6);
  });

  it('when a stroke ends, then the level has fallen to under half, and never under nothing', () => {
    expect(Math.min(...levels)).toBeGreaterThan(0);
    expect(Math.min(...levels)).toBeLessThan(Math.max(...levels) / 2);
  });

  it('when several players stroke, then each has a rate of its own, eight to twelve a second', () => {
    expect(new Set(ratesHz).size).toBe(5);
    for (const rate of ratesHz) {
      expect(rate).toBeGreaterThan(8);
      expect(rate).toBeLessThan(12);
    }
  });
});
