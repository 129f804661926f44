import { describe, expect, it } from 'vitest';
import { amplitudeOf, chordLevel, FULL_CHORD_LEVEL, levelOf, loudestLevel, scaleFor } from '@/audio/levels';
import { seriesOn, voiceSound } from '../../../support/sounds';

describe('levels', () => {
  it('when a level is 20 dB, then the amplitude is ten times that of 0 dB, and back', () => {
    expect(amplitudeOf(20)).toBeCloseTo(10, 12);
    expect(levelOf(10)).toBeCloseTo(20, 12);
    expect(amplitudeOf(-Infinity)).toBe(0);
    expect(levelOf(0)).toBe(-Infinity);
  });

  it('when two partials are equally strong, then together they are 3.01 dB stronger', () => {
    const both = voiceSound('both', { partials: seriesOn(110, [-6, -6]) });
    expect(chordLevel([both])).toBeCloseTo(-6 + 3.0103, 4);
  });

  it('when nothing sounds, then there is no level and nothing is made loud', () => {
    expect(chordLevel([])).toBe(-Infinity);
    expect(scaleFor(chordLevel([]))).toBe(0);
  });

  it('when a soft and a loud chord share the scale, then the loud one is full and the soft one stays softer', () => {
    const soft = [voiceSound('soft', { partials: seriesOn(110, [3]) })];
    const loud = [voiceSound('loud', { partials: seriesOn(110, [21]) })];
    const loudest = loudestLevel([soft, loud]);
    const played = (level: number) => levelOf(scaleFor(loudest)) + level;
    expect(played(chordLevel(loud))).toBeCloseTo(FULL_CHORD_LEVEL, 9);
    expect(played(chordLevel(soft))).toBeCloseTo(FULL_CHORD_LEVEL - 18, 9);
  });
});
