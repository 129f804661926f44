import { describe, expect, it } from 'vitest';
import { levelOf } from '@/audio/levels';
import { isTurned, wavesOf, type Wave, type WaveKind } from '@/audio/waves';
import { seriesOn } from '../../../support/sounds';

const SAWTOOTH = Array.from({ length: 32 }, (_, index) => -20 * Math.log10(index + 1));

/** One period as the Web Audio API defines it: the sum of a·cos + b·sin. */
function periodOf({ real, imag }: Wave, samples: number): number[] {
  return Array.from({ length: samples }, (_, index) => {
    const angle = (2 * Math.PI * index) / samples;
    return real.reduce(
      (sum, a, n) => sum + a * Math.cos(n * angle) + (imag[n] ?? 0) * Math.sin(n * angle),
      0,
    );
  });
}

function levelOfTerm({ real, imag }: Wave, n: number): number {
  return levelOf(Math.hypot(real[n] ?? 0, imag[n] ?? 0));
}

describe('wavesOf', () => {
  it('when partials are one harmonic series, then one wave holds each at its level', () => {
    const [wave, ...others] = wavesOf(seriesOn(73.42, SAWTOOTH), true);
    if (!wave) throw new Error('no wave');
    expect(others).toEqual([]);
    expect(wave.fundamentalHz).toBeCloseTo(73.42, 9);
    SAWTOOTH.forEach((levelDb, index) => expect(levelOfTerm(wave, index + 1)).toBeCloseTo(levelDb, 4));
    expect(levelOfTerm(wave, 0)).toBe(-Infinity);
  });

  it('when a partial is no exact multiple, then it sounds at its own frequency in a wave of its own', () => {
    const stretched = { n: 3, frequencyHz: 331.5, levelDb: -9 };
    const waves = wavesOf([...seriesOn(110, [0, -6]), stretched], false);
    expect(waves.map(({ fundamentalHz }) => fundamentalHz)).toEqual([110, 110.5]);
    const [, alone] = waves;
    if (!alone) throw new Error('no second wave');
    expect(levelOfTerm(alone, 3)).toBeCloseTo(-9, 4);
    expect(levelOfTerm(alone, 1)).toBe(-Infinity);
  });

  it('when only the upper partials of a note are wanted, then they keep their frequency and level', () => {
    const upper = seriesOn(110, SAWTOOTH).slice(4, 8);
    const [wave] = wavesOf(upper, true);
    if (!wave) throw new Error('no wave');
    expect(wave.fundamentalHz).toBeCloseTo(110, 9);
    expect(levelOfTerm(wave, 1)).toBe(-Infinity);
    expect(levelOfTerm(wave, 5)).toBeCloseTo(SAWTOOTH[4] ?? NaN, 4);
  });

  it('when the phases are spread, then a bowed spectrum peaks lower than with all in phase', () => {
    const [wave] = wavesOf(seriesOn(110, SAWTOOTH), false);
    if (!wave) throw new Error('no wave');
    const peak = Math.max(...periodOf(wave, 2048).map(Math.abs));
    const inPhase = SAWTOOTH.reduce((sum, _, index) => sum + 1 / (index + 1), 0);
    expect(peak).toBeLessThan(0.7 * inPhase);
  });

  it('when there are no partials, then there is nothing to sound', () => {
    expect(wavesOf([], false)).toEqual([]);
  });

  it('when two neighbours in the score play the same note, then a quarter of a period lies between all their partials', () => {
    expect(isTurned('viola')).not.toBe(isTurned('cello'));
    expect(isTurned('violin1')).not.toBe(isTurned('violin2'));
    expect(inStepOf(waveFor(false, 'middle'), waveFor(true, 'middle'))).toBeLessThan(1e-6);
  });

  it("when a section's other players join, then their wave stands a quarter of a period from the first one's", () => {
    const [middle, others] = [waveFor(false, 'middle'), waveFor(false, 'others')];
    expect(inStepOf(middle, others)).toBeLessThan(1e-6);
    expect(levelOfTerm(others, 3)).toBeCloseTo(levelOfTerm(middle, 3), 4);
  });
});

function waveFor(turned: boolean, kind: WaveKind): Wave {
  const [wave] = wavesOf(seriesOn(110, SAWTOOTH), turned, kind);
  if (!wave) throw new Error('no wave');
  return wave;
}

/** How far the partials of two waves are in step: 0 for a quarter of a period between them, 1 for none or half. */
function inStepOf(a: Wave, b: Wave): number {
  return Math.max(
    ...SAWTOOTH.map((_, index) => {
      const n = index + 1;
      const [realA, imagA, realB, imagB] = [a.real[n] ?? 0, a.imag[n] ?? 0, b.real[n] ?? 0, b.imag[n] ?? 0];
      return Math.abs(
        (realA * realB + imagA * imagB) / (Math.hypot(realA, imagA) * Math.hypot(realB, imagB)),
      );
    }),
  );
}
