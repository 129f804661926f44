import { describe, expect, it } from 'vitest';
import { largestBreak, linesOf, peakOf } from '../../e2e/support/spectrum';

const RATE = 48_000;

function recording(seconds: number, sampleAt: (second: number) => number) {
  const left = Float32Array.from({ length: seconds * RATE }, (_, index) => sampleAt(index / RATE));
  return { sampleRate: RATE, left, right: new Float32Array(left.length) };
}

function sine(frequencyHz: number, amplitude: number) {
  return (second: number) => amplitude * Math.sin(2 * Math.PI * frequencyHz * second);
}

describe('linesOf', () => {
  it('when two tones of known frequency and level sound, then they are found, the stronger first', () => {
    const [strong, weak] = [sine(73.42, 0.1), sine(79.13, 0.001)];
    const [first, second] = linesOf(recording(3, (second_) => strong(second_) + weak(second_)));
    expect(first?.frequencyHz).toBeCloseTo(73.42, 2);
    expect(first?.levelDb).toBeCloseTo(-20, 1);
    expect(second?.frequencyHz).toBeCloseTo(79.13, 2);
    expect(second?.levelDb).toBeCloseTo(-60, 1);
  });
});

describe('largestBreak', () => {
  const tone = sine(440, 0.5);

  it('when a tone is cut off at its peak, then the break is as high as the peak', () => {
    const quarter = 0.25 / 440;
    const cut = recording(1, (second) => (second < 0.5 + quarter ? tone(second) : 0));
    expect(largestBreak(cut)).toBeGreaterThan(0.45);
    expect(largestBreak(cut)).toBeLessThan(0.55);
  });

  it('when a tone fades, then there is no break to speak of', () => {
    const faded = recording(1, (second) => tone(second) * Math.max(0, 1 - second / 0.03));
    expect(largestBreak(faded)).toBeLessThan(0.001 * peakOf(faded));
  });
});
