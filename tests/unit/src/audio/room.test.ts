import { describe, expect, it } from 'vitest';
import { roomAnswer } from '@/audio/room';

const RATE = 48_000;
const energyOf = (samples: Float32Array) => samples.reduce((sum, sample) => sum + sample ** 2, 0);

describe('roomAnswer', () => {
  const { left, right } = roomAnswer(RATE);

  it('when it is made twice, then it is the same', () => {
    const again = roomAnswer(RATE).left;
    expect(again.every((sample, index) => sample === left[index])).toBe(true);
  });

  it('when sound goes in, then as much energy comes back to each ear', () => {
    expect(energyOf(left)).toBeCloseTo(1, 4);
    expect(energyOf(right)).toBeCloseTo(1, 4);
    expect(left).toHaveLength(43_200);
  });

  it('when both ears are compared, then they hear different answers', () => {
    const alike = left.reduce((sum, sample, index) => sum + sample * (right[index] ?? 0), 0);
    expect(Math.abs(alike)).toBeLessThan(0.2);
  });

  it('when time passes, then the answer dies away, and ends in nothing', () => {
    const tenths = Array.from({ length: 9 }, (_, index) =>
      energyOf(left.subarray((index * RATE) / 10, ((index + 1) * RATE) / 10)),
    );
    for (const [index, energy] of tenths.entries()) {
      if (index > 0) expect(energy).toBeLessThan(tenths[index - 1] ?? 0);
    }
    expect(Math.abs(left.at(-1) ?? 1)).toBeLessThan(1e-6);
  });
});
