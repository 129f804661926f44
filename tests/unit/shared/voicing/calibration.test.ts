import { describe, expect, it } from 'vitest';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { CALIBRATION_FIT, MUDDINESS_CONSTANTS } from '#shared/data/muddiness-constants';
import { compareLimits, leaveOneOut } from '#shared/voicing/calibration/threshold';
import { limitCurves, limitOnCurve } from '#shared/voicing/calibration/limit-curves';
import { judge } from '#shared/voicing/calibration/judgement';
import { costParts } from '#shared/voicing/calibration/cost';
import {
  correlation,
  correlationInterval,
  mean,
  rootMeanSquare,
} from '#shared/voicing/calibration/statistics';
import { COMMON_PRACTICE_ORDERINGS } from '#shared/data/common-practice-orderings';
import { midiOfName } from '#shared/pitch/names';
import { dealtVoicing } from '#shared/voicing/calibration/yardsticks';
import { peakDensity } from '#shared/voicing/muddiness/model';
import { indexOf } from '#shared/voicing/muddiness/scores';
import { modelFor } from '#shared/voicing/muddiness/models';

const curves = limitCurves(modelFor(440), LOW_INTERVAL_LIMITS);
const fit = compareLimits(curves, MUDDINESS_CONSTANTS.threshold);

describe('the chart of low interval limits', () => {
  it('when one threshold is drawn, then the chart is reproduced to 1.7 semitones rms, 0.8 from the nearest variant', () => {
    expect(fit.comparisons.every(({ model }) => model !== null)).toBe(true);
    expect(fit.rmsFromChart).toBeLessThanOrEqual(1.7);
    expect(fit.rmsFromVariant).toBeLessThanOrEqual(0.8);
  });

  it('when each interval is left out in turn, then the rest predict it to 1.1 semitones rms', () => {
    const errors = leaveOneOut(curves).map(({ fromVariant }) => fromVariant);
    expect(errors).toHaveLength(15);
    expect(rootMeanSquare(errors)).toBeLessThanOrEqual(1.1);
    expect(CALIBRATION_FIT.rmsLeftOut).toBeLessThanOrEqual(1.1);
  });

  it('when the constants in force are judged again, then they give the fit that is printed with them', () => {
    const judgement = judge(MUDDINESS_CONSTANTS);
    expect(judgement.limits.threshold / MUDDINESS_CONSTANTS.threshold).toBeCloseTo(1, 4);
    expect(judgement.limits.rmsFromChart).toBeCloseTo(CALIBRATION_FIT.rmsFromChart, 3);
    expect(judgement.limits.rmsFromVariant).toBeCloseTo(CALIBRATION_FIT.rmsFromNearestVariant, 3);
    expect(judgement.correlation).toBeCloseTo(CALIBRATION_FIT.correlation, 4);
  });
});

describe('every other yardstick', () => {
  const judgement = judge(MUDDINESS_CONSTANTS);

  it('when common practice calls one voicing muddier than another, then so does the index, clearly', () => {
    expect(judgement.orderings).toHaveLength(20);
    judgement.orderings.forEach((margin) => expect(margin).toBeGreaterThanOrEqual(1));
  });

  it('when listeners rated the chords of registers 1 to 5, then the index agrees at r = −0.85 or better', () => {
    expect(judgement.correlation).toBeLessThanOrEqual(-0.85);
    const [low, high] = correlationInterval(judgement.correlation, 14);
    expect(low).toBeLessThan(judgement.correlation);
    expect(high).toBeGreaterThan(judgement.correlation);
    expect(high).toBeLessThan(-0.5);
  });

  it('when real chords pass no limit, then nine in ten score 50 or less and none over 60', () => {
    const { scoreChords } = judgement;
    expect(scoreChords).toHaveLength(19);
    expect(scoreChords.filter((index) => index <= 50).length / scoreChords.length).toBeGreaterThanOrEqual(
      0.9,
    );
    expect(Math.max(...scoreChords)).toBeLessThanOrEqual(60);
  });

  it('when chords pass a limit, then they score 55 or more', () => {
    expect(Math.min(...judgement.passingChords)).toBeGreaterThanOrEqual(55);
  });

  it('when chords stand open, then they score 55 or less and under 45 in the mean', () => {
    expect(Math.max(...judgement.openChords)).toBeLessThanOrEqual(55);
    expect(mean(judgement.openChords)).toBeLessThan(45);
  });

  it('when chords stand close and low, then they score over 75', () => {
    expect(Math.min(...judgement.closeChords)).toBeGreaterThan(75);
  });

  it('when fifths at the bottom lie between basses and cellos, then none scores over 50 from C2 up', () => {
    const { fifths } = judgement.dealt;
    expect(fifths).toHaveLength(6);
    expect(Math.max(...fifths)).toBeLessThanOrEqual(50);
  });

  it('when cellos double the basses at the octave and the rest stands open, then it scores under 45', () => {
    expect(judgement.dealt.octaves).toHaveLength(6);
    expect(Math.max(...judgement.dealt.octaves)).toBeLessThan(45);
  });

  it('when open chords are dealt from the bottom with the basses, then none scores over 50, under 45 in the mean', () => {
    const { open } = judgement.dealt;
    expect(open).toHaveLength(5);
    expect(Math.max(...open)).toBeLessThanOrEqual(50);
    expect(mean(open)).toBeLessThan(45);
  });

  it('when the real chords are dealt from the bottom with the basses, then nine in ten score 50 or less, none over 60', () => {
    const { score } = judgement.dealt;
    expect(score).toHaveLength(19);
    expect(score.filter((index) => index <= 50).length / score.length).toBeGreaterThanOrEqual(0.9);
    expect(Math.max(...score)).toBeLessThanOrEqual(60);
  });

  it('when close low chords are dealt so, then they score over 75 still, and those passing a limit 55 or more', () => {
    expect(judgement.dealt.close).toHaveLength(3);
    expect(Math.min(...judgement.dealt.close)).toBeGreaterThan(75);
    expect(judgement.dealt.passing).toHaveLength(5);
    expect(Math.min(...judgement.dealt.passing)).toBeGreaterThanOrEqual(55);
  });

  it('when common practice is dealt so, then it still calls the same voicings muddier', () => {
    const index = (names: readonly string[]) =>
      indexOf(peakDensity(modelFor(440), dealtVoicing(names.map(midiOfName))), MUDDINESS_CONSTANTS.threshold);
    for (const { muddier, clearer } of COMMON_PRACTICE_ORDERINGS) {
      expect([muddier, index(muddier) > index(clearer)]).toEqual([muddier, true]);
    }
  });

  it('when C E G stands at C4 and at C3, then it scores between 0 and 25, and between 25 and 60', () => {
    expect(judgement.clearTriad).toBeGreaterThan(0);
    expect(judgement.clearTriad).toBeLessThan(25);
    expect(judgement.middleTriad).toBeGreaterThanOrEqual(25);
    expect(judgement.middleTriad).toBeLessThanOrEqual(60);
  });

  it('when all yardsticks hold, then the limits cost more than twice what all the others do', () => {
    const { limits, ...others } = costParts(judgement);
    const sum = Object.values(others).reduce((whole, part) => whole + part, 0);
    expect(sum).toBeLessThan(limits / 2);
  });
});

describe('a limit on a curve', () => {
  it('when ρ halves each semitone, then the limit lies where it passes the threshold, between the keys', () => {
    const curve = { lowest: 40, logDensity: [3, 2, 1, 0].map((n) => n * Math.log(2)) };
    expect(limitOnCurve(curve, 2)).toBeCloseTo(42, 12);
    expect(limitOnCurve(curve, 2 ** 1.5)).toBeCloseTo(41.5, 12);
  });

  it('when ρ never passes the threshold, or not at the top, then there is no limit', () => {
    const curve = { lowest: 40, logDensity: [0, -1, -2] };
    expect(limitOnCurve(curve, 2)).toBeNull();
    expect(limitOnCurve(curve, 0.01)).toBeNull();
  });

  it('when ρ crosses the threshold twice, then the upper crossing is the limit', () => {
    expect(limitOnCurve({ lowest: 40, logDensity: [1, -1, 1, -1] }, 1)).toBeCloseTo(42.5, 12);
  });
});

describe('statistics', () => {
  it('when numbers lie on a line, then they correlate fully', () => {
    expect(correlation([1, 2, 3], [2, 4, 6])).toBeCloseTo(1, 12);
    expect(correlation([1, 2, 3], [3, 2, 1])).toBeCloseTo(-1, 12);
  });

  it('when r is 0.5 of 28 points, then its 95 % interval is 0.156 to 0.736 (Fisher)', () => {
    // Independent: z = 0.549306, half-width 1.959964 / 5 = 0.391993; tanh(0.157313) and tanh(0.941299).
    const [low, high] = correlationInterval(0.5, 28);
    expect(low).toBeCloseTo(0.156, 3);
    expect(high).toBeCloseTo(0.7358, 3);
  });

  it('when there are no numbers, then their mean is 0', () => {
    expect(mean([])).toBe(0);
    expect(rootMeanSquare([3, 4])).toBeCloseTo(Math.sqrt(12.5), 12);
  });
});
