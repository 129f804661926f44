import { describe, expect, it } from 'vitest';
import { brightnessGain, nominalLevel } from '#shared/acoustics/level';
import { spectrumOf } from '#shared/acoustics/spectrum';
import { partialCount, techniqueLevel } from '#shared/acoustics/technique';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { MUDDINESS_CONSTANTS } from '#shared/data/muddiness-constants';
import { harmonicPartials, sumOverPairs } from '#shared/hearing/partials';
import { techniqueSchema } from '#shared/study/study.document';
import { analyseChord } from '#shared/voicing/analysis';
import { hearPartials, isHeard } from '#shared/voicing/audibility';
import { balanceOf } from '#shared/voicing/balance';
import { orderingMargin } from '#shared/voicing/calibration/judgement';
import { fromNearestVariant, limitOnCurve } from '#shared/voicing/calibration/limit-curves';
import { mean, rootMeanSquare } from '#shared/voicing/calibration/statistics';
import { limitCost } from '#shared/voicing/calibration/threshold';
import { dealtVoicing, sectionFor, voicingOf } from '#shared/voicing/calibration/yardsticks';
import { fullAnalysis } from '#shared/voicing/full-analysis';
import { helpfulMoves } from '#shared/voicing/moves/helpful-moves';
import { movedVoices } from '#shared/voicing/moves/moves';
import { possibleMoves } from '#shared/voicing/moves/possible-moves';
import { pitchAt, pitchAxis, windowValue } from '#shared/voicing/muddiness/axis';
import { poolingPower } from '#shared/voicing/muddiness/constants';
import { inUnison, powerOf } from '#shared/voicing/muddiness/joined';
import { fusionOf } from '#shared/voicing/muddiness/pairs';
import { cloudiestOf, densityOfIndex } from '#shared/voicing/muddiness/scores';
import { neighbourWeight } from '#shared/voicing/muddiness/tables';
import type { Tone } from '#shared/voicing/muddiness/tones';
import { cloudingAt, distanceErb, toneOf } from '#shared/voicing/muddiness/tones';
import { clearlyBelow, differClearly, uncertaintyOf } from '#shared/voicing/uncertainty';
import { seriesOn, voiceSound } from '../../../support/sounds';
import { chordOf, EVEN_SETTINGS, voicing } from '../../../support/voicings';

const ordinary = techniqueSchema.parse({});
const series = Array.from({ length: 32 }, () => 0);

/** A note as the index takes it. */
function toneAt(midi: number): Tone {
  const [voice] = voicingOf([midi]);
  if (!voice) throw new Error('no voice');
  return voice.makeTone();
}

describe('the examples of the sound', () => {
  it('when a tone, a level or a technique is asked for as its example does, then it answers as printed there', () => {
    const source = { instrument: 'cello', technique: ordinary, dynamic: 'mf', f0Hz: 220 } as const;
    expect(spectrumOf(source)[1]?.frequencyHz).toBe(440);
    expect(nominalLevel('violin', 'mf', ordinary, 1)).toBe(0);
    expect(brightnessGain('f', 3000)).toBeCloseTo(0.5, 12);
    expect(partialCount({ ...ordinary, harmonic: 'natural' })).toBe(12);
    expect(techniqueLevel(ordinary)).toBe(0);
    expect(sumOverPairs(harmonicPartials([69], 3, 'exact'), () => 1)).toBe(3);
  });

  it('when partials are heard, then each voice begins behind the last, and 20 dB more masks', () => {
    const heard = hearPartials([
      voiceSound('a', { partials: seriesOn(65, series) }),
      voiceSound('b', { partials: seriesOn(130, series) }),
    ]);
    expect(heard.starts).toEqual([0, 32, 64]);
    expect(isHeard(heard, 9, (heard.levels[9] ?? NaN) + 19.9)).toBe(true);
    expect(isHeard(heard, 9, (heard.levels[9] ?? NaN) + 20)).toBe(false);
    expect(balanceOf([])).toEqual({ voices: [], tones: [] });
  });
});

describe('the examples of the index', () => {
  it('when its parts are asked for as their examples do, then they answer as printed there', () => {
    expect(neighbourWeight(6)).toBeCloseTo(0.5, 12);
    expect(cloudingAt(MUDDINESS_CONSTANTS.peakErb, MUDDINESS_CONSTANTS)).toBeCloseTo(1, 12);
    expect(distanceErb(1000, 1000)).toBe(0);
    expect(pitchAxis(0.5).count).toBe(202);
    expect(pitchAt(pitchAxis(0.5), 1)).toBe(12);
    expect(windowValue(2, 2)).toBeCloseTo(Math.exp(-2), 12);
    expect(powerOf(10)).toBeCloseTo(10, 12);
    expect(inUnison({ f0Hz: 440 }, { f0Hz: 441 })).toBe(false);
    expect(poolingPower({ pooling: 2 })(3)).toBe(9);
    expect(densityOfIndex(50, 0.2)).toBeCloseTo(0.2, 12);
    expect(cloudiestOf([])).toBeNull();
  });

  it('when a tone is made, then its series falls as 1/n with the sum of the squares 1, whatever its levels', () => {
    const { series: weights } = toneOf(seriesOn(110, [-30, 0, -12, 6]), 440);
    const whole = 1 + 1 / 4 + 1 / 9 + 1 / 16;
    weights.forEach((weight, i) => expect(weight).toBeCloseTo(1 / ((i + 1) * Math.sqrt(whole)), 12));
  });

  it('when notes fuse, then a unison fully, a fifth far, a minor sixth hardly, whichever sections play', () => {
    const fusion = (a: number, b: number) => fusionOf(toneAt(a), toneAt(b), MUDDINESS_CONSTANTS);
    expect(fusion(57, 57)).toBeGreaterThanOrEqual(1);
    expect(fusion(57, 64)).toBeGreaterThan(3 * fusion(57, 65));
    // Up to A2 cellos play here and below C2 basses: an octave fuses alike in both.
    expect(fusion(38, 50)).toBeCloseTo(fusion(26, 38), 1);
  });

  it('when bands are weighed, then clearly below is the edge of what differs clearly', () => {
    expect(uncertaintyOf(0)).toBe(0);
    expect(differClearly(50, 50.9)).toBe(false);
    expect(differClearly(clearlyBelow(80), 80)).toBe(false);
    expect(differClearly(clearlyBelow(80) - 0.001, 80)).toBe(true);
  });
});

describe('the examples of the calibration', () => {
  it('when its parts are asked for as their examples do, then they answer as printed there', () => {
    expect(limitCost({ rmsFromVariant: 1, rmsFromChart: 2 })).toBe(2);
    expect(mean([1, 2, 6])).toBe(3);
    expect(rootMeanSquare([3, 4])).toBeCloseTo(3.5355, 4);
    expect(limitOnCurve({ lowest: 40, logDensity: [1, -1] }, 1)).toBe(40.5);
    expect(orderingMargin(0.2, 0.1, 0.1)).toBeCloseTo(25, 12);
    const fifth = LOW_INTERVAL_LIMITS.find(({ semitones }) => semitones === 7);
    expect(fifth && fromNearestVariant(38, fifth)).toBe(1);
  });

  it('when C2 and G2 are given out, then to cellos by octaves and to basses and cellos as an orchestra deals', () => {
    expect(sectionFor(36)).toBe('cello');
    const keys = dealtVoicing([36, 43]).map(({ key }) => key.split(' ')[0]);
    expect(keys).toEqual(['doubleBass', 'cello']);
  });
});

describe('the examples of the moves', () => {
  it('when a voice is left out or locked, or stands alone, then no more is done than that', () => {
    const { voices } = voicing('C2 E2 G2');
    const left = movedVoices(voices, {
      kind: 'leaveOut',
      ids: ['voice-1'],
      pitches: [],
      section: 'cello',
    });
    expect(left.map(({ pitch }) => pitch)).toEqual(['C2', 'G2']);
    expect(possibleMoves(chordOf([{ pitch: 'C3', locked: true }]).voices, 'four-string')).toEqual([]);
    expect(helpfulMoves(voicing('C2'), EVEN_SETTINGS)).toEqual([]);
  });

  it('when moves of one voice alone are asked for, then they are those of it among all moves', () => {
    const { voices } = voicing('C2 E2 G2 C3');
    const all = possibleMoves(voices, 'four-string').filter(({ ids }) => ids.includes('voice-2'));
    expect(possibleMoves(voices, 'four-string', ({ id }) => id === 'voice-2')).toEqual(all);
  });

  it('when everything is asked of a chord, then its muddiness is that of the analysis', () => {
    const chord = voicing('C2 E2 G2');
    expect(fullAnalysis(chord, EVEN_SETTINGS).muddiness).toEqual(
      analyseChord(chord, EVEN_SETTINGS).muddiness,
    );
  });
});
