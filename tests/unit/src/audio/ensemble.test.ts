import { describe, expect, it } from 'vitest';
import { playersOf, seedOf } from '@/audio/ensemble';

const SEEDS = ['melody', 'bass-line', 'inner-1', 'inner-2'].map(seedOf);

describe('playersOf', () => {
  it('when one player plays, then nothing is spread', () => {
    expect(playersOf(1, 110, 7)).toEqual([{ cents: 0, share: 1, laterPeriods: 0 }]);
  });

  it('when a section plays, then the energies of its players make the plotted one', () => {
    for (const players of [2, 3, 4, 16]) {
      const energy = playersOf(players, 110, 7).reduce((sum, { share }) => sum + share ** 2, 0);
      expect(energy).toBeCloseTo(1, 12);
    }
  });

  it('when a section plays, then the middle of its pitches is the plotted one, and nobody is ten cents away', () => {
    for (const seed of SEEDS) {
      const players = playersOf(8, 110, seed);
      const middle = players.reduce((sum, { cents, share }) => sum + cents * share ** 2, 0);
      expect(Math.abs(middle)).toBeLessThan(1e-9);
      expect(players).toHaveLength(5);
      for (const { cents } of players.slice(1)) {
        expect(Math.abs(cents)).toBeGreaterThanOrEqual(3);
        expect(Math.abs(cents)).toBeLessThan(10);
      }
    }
  });

  it('when a section begins, then its players begin within 30 ms, and not all at once', () => {
    for (const seed of SEEDS) {
      const fundamentalHz = 110;
      const late = playersOf(12, fundamentalHz, seed).map(({ laterPeriods }) => laterPeriods / fundamentalHz);
      expect(new Set(late).size).toBe(late.length);
      expect(Math.max(...late)).toBeLessThan(0.03);
      expect(Math.min(...late)).toBe(0);
    }
  });

  it('when the same voice is asked for again, then it is spread in the same way, another voice in another', () => {
    const [one = 0, other = 0] = SEEDS;
    expect(playersOf(8, 110, one)).toEqual(playersOf(8, 110, one));
    expect(playersOf(8, 110, one)).not.toEqual(playersOf(8, 110, other));
    expect(seedOf('AB')).toBe(65 * 31 + 66);
  });
});
