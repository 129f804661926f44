import { describe, expect, it } from 'vitest';
import { makeUpGain } from '@/audio/make-up-gain';

describe('makeUpGain', () => {
  it('when nothing is held down, then nothing is added', () => {
    expect(makeUpGain(0, 20)).toBe(1);
    expect(makeUpGain(-24, 1)).toBe(1);
  });

  it('when full scale would be held down by 20 dB, then 12 dB are added: 0.6 of it', () => {
    // −40 dB at a ratio of 2 leaves full scale at −20 dB; 0.6 · 20 dB = 12 dB = 10 ^ 0.6.
    expect(makeUpGain(-40, 2)).toBeCloseTo(10 ** 0.6, 12);
  });
});
