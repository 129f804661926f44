import { describe, expect, it } from 'vitest';
import { DEFAULT_SPAN, pitchAxis } from '@/charts/pitch-axis';

describe('the pitch axis', () => {
  it('when nothing lies further out, then C1 to C7 are on it and an octave is everywhere as high', () => {
    const axis = pitchAxis([], 514, 40);
    const heights = axis.octaves.slice(1).map(({ y }, index) => (axis.octaves[index]?.y ?? 0) - y);
    expect(axis.octaves.map(({ octave }) => octave)).toEqual([1, 2, 3, 4, 5, 6, 7]);
    for (const height of heights) expect(height).toBeCloseTo(12 * axis.semitone, 9);
    expect(axis.yOf(DEFAULT_SPAN.high)).toBe(40);
    expect(axis.yOf(DEFAULT_SPAN.low)).toBe(514);
  });

  it('when a height is read, then it is the key that stands there', () => {
    const axis = pitchAxis([], 500, 40);
    for (let midi = 23; midi <= 96; midi += 1) expect(axis.midiAt(axis.yOf(midi))).toBe(midi);
    expect(axis.midiAt(-50)).toBe(96);
    expect(axis.midiAt(5000)).toBe(23);
  });

  it('when a note lies further out, then the axis makes room for it', () => {
    const axis = pitchAxis([21, 108], 500, 40);
    expect(axis.yOf(21)).toBeLessThan(500);
    expect(axis.yOf(108)).toBeGreaterThan(40);
    expect(axis.midiAt(axis.yOf(108))).toBe(108);
  });

  it('when a partial lies over the axis, then it stands in the strip, the higher one above', () => {
    const axis = pitchAxis([], 500, 40);
    const ys = [97, 105, 115, 123].map(axis.yOf);
    expect(ys).toEqual([...ys].sort((a, b) => b - a));
    for (const y of ys) {
      expect(y).toBeGreaterThanOrEqual(0);
      expect(y).toBeLessThanOrEqual(40);
    }
  });
});
