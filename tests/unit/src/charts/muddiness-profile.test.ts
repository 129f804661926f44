import { describe, expect, it } from 'vitest';
import { profileBars } from '@/charts/muddiness-profile';

describe('profileBars', () => {
  const bars = profileBars(
    [
      { register: 'great', index: 100 },
      { register: 'small', index: 50 },
      { register: 'one-line', index: 0 },
    ],
    40,
    30,
  );

  it('when registers are drawn, then the low ones stand at the bottom', () => {
    expect(bars.map(({ register, y }) => [register, y])).toEqual([
      ['great', 20],
      ['small', 10],
      ['one-line', 0],
    ]);
  });

  it('when an index is drawn, then its length is its share of the whole scale', () => {
    expect(bars[0]?.width).toBe(40);
    expect(bars[1]?.width).toBe(20);
  });

  it('when a register is clear, then something of it is still seen', () => {
    expect(bars[2]?.width).toBeGreaterThan(0);
    expect(bars[2]?.fill).toBe('var(--silt-0)');
  });
});
