import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MUDDINESS_CONSTANTS } from '#shared/data/muddiness-constants';
import type { Tone } from '#shared/voicing/muddiness/tones';
import { toneOf } from '#shared/voicing/muddiness/tones';
import { cloudingAt } from '#shared/voicing/muddiness/tones';
import { pitchAxis } from '#shared/voicing/muddiness/axis';
import { voicingOf } from '#shared/voicing/calibration/yardsticks';
import { densityOf } from '#shared/voicing/muddiness/model';
import { modelFor } from '#shared/voicing/muddiness/models';
import { plainDensity } from '#shared/voicing/muddiness/plain';

const axis = pitchAxis(0.5);

/** A pure tone: one partial. */
function pure(frequencyHz: number): Tone {
  return toneOf([{ n: 1, frequencyHz, levelDb: 0 }], 440);
}

describe('the plain double loop', () => {
  it('when two pure tones sound alone, then ρ is what the equations give by hand', () => {
    // Two tones of energy 1, a semitone apart on A2 = 110 Hz, which is a point of the axis; taken at 110 Hz.
    const low = pure(110);
    const high = pure(110 * 2 ** (1 / 12));
    const mean = (110 + 110 * 2 ** (1 / 12)) / 2;
    const y = ((mean - 110) * 2) / (24.7 * ((4.37 * mean) / 1000 + 1));
    const {
      peakErb,
      sharpness,
      fusionErb,
      fusionStrength,
      floor,
      cornerHz,
      slope,
      windowSemitones,
      localWindowSemitones,
    } = MUDDINESS_CONSTANTS;
    const g = ((y / peakErb) * Math.exp(1 - y / peakErb)) ** sharpness;
    const fused = 1 + fusionStrength * Math.exp(-((y / fusionErb) ** 2));
    const meanPitch = 12 * Math.log2(mean / 110);
    const clouding = (g / fused) * Math.exp(-2 * (meanPitch / windowSemitones) ** 2);
    const energy = 1 + Math.exp(-2 * (1 / localWindowSemitones) ** 2);
    const expected = (clouding / (energy + floor)) * (1 / (1 + (110 / cornerHz) ** slope));
    const density = plainDensity(
      [low, high].map((tone) => ({ tone, energy: 1 })),
      MUDDINESS_CONSTANTS,
      440,
      axis,
    );
    const a2 = Math.round((45 - 11.5) / 0.5);
    // The axis gathers masses at eighths of a semitone: a part in a thousand.
    expect(Math.abs((density[a2] ?? 0) / expected - 1)).toBeLessThan(0.002);
  });

  it('when any chord of two to eight voices is judged, then the tables agree to 1e-9', () => {
    const model = modelFor(440);
    const notes = fc.uniqueArray(fc.integer({ min: 24, max: 96 }), { minLength: 2, maxLength: 8 });
    fc.assert(
      fc.property(notes, (midi) => {
        const voices = voicingOf(midi);
        const plain = plainDensity(
          voices.map(({ makeTone, energy }) => ({ tone: makeTone(), energy })),
          MUDDINESS_CONSTANTS,
          440,
          axis,
        );
        const quick = densityOf(model, voices);
        plain.forEach((value, x) => expect(Math.abs(value - (quick[x] ?? NaN))).toBeLessThanOrEqual(1e-9));
      }),
      { numRuns: 40 },
    );
  });
});

describe('the clouding of two partials', () => {
  it('when they lie at the peak, then it is 1; less to either side; nothing at a unison or out of reach', () => {
    const { peakErb, reachErb } = MUDDINESS_CONSTANTS;
    expect(cloudingAt(peakErb, MUDDINESS_CONSTANTS)).toBeCloseTo(1, 12);
    expect(cloudingAt(peakErb * 0.9, MUDDINESS_CONSTANTS)).toBeLessThan(1);
    expect(cloudingAt(peakErb * 1.1, MUDDINESS_CONSTANTS)).toBeLessThan(1);
    expect(cloudingAt(0, MUDDINESS_CONSTANTS)).toBe(0);
    expect(cloudingAt(reachErb, MUDDINESS_CONSTANTS)).toBe(0);
  });
});
