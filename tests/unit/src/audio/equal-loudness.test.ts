import { describe, expect, it } from 'vitest';
import { equalLoudness, weighedLevel } from '@/audio/equal-loudness';
import { seriesOn, voiceSound } from '../../../support/sounds';

const toneAt = (frequencyHz: number, levelDb: number) =>
  voiceSound('tone', { partials: seriesOn(frequencyHz, [levelDb]) });

describe('weighedLevel', () => {
  it('when nothing sounds, then there is no level', () => {
    expect(weighedLevel([])).toBe(-Infinity);
  });

  it('when a tone of 1 kHz sounds, then its weighed level is its level', () => {
    expect(weighedLevel([toneAt(1000, -7)])).toBeCloseTo(-7, 6);
  });

  it('when a tone of 100 Hz has the level of the 60 phon contour, then it is as loud as 60 dB at 1 kHz', () => {
    // ISO 226:2003, table of the 60 phon contour: 78.5 dB at 100 Hz (from memory of the standard's annex).
    expect(weighedLevel([toneAt(100, 78.5)])).toBeCloseTo(60, 0);
  });

  it('when a tone sounds twice, then the weighed energy is doubled', () => {
    const tone = toneAt(300, 0);
    expect(weighedLevel([tone, tone]) - weighedLevel([tone])).toBeCloseTo(3.01, 2);
  });
});

describe('equalLoudness', () => {
  const low = [toneAt(60, 0)];
  const high = [toneAt(2000, 0)];

  it('when the two are the same, then nothing is taken off', () => {
    expect(equalLoudness(high, high)).toEqual({ a: 0, b: 0 });
  });

  it('when one is louder, then it alone is taken back, as far as the other is', () => {
    const { a, b } = equalLoudness(low, high);
    expect(a).toBe(0);
    expect(b).toBeLessThan(0);
    expect(weighedLevel(high) + b).toBeCloseTo(weighedLevel(low), 6);
    expect(equalLoudness(high, low)).toEqual({ a: b, b: 0 });
  });

  it('when one is silent, then the other stays as it is', () => {
    expect(equalLoudness([], high)).toEqual({ a: 0, b: 0 });
  });
});
