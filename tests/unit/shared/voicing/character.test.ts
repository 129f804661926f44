import { describe, expect, it } from 'vitest';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { equalTempered } from '#shared/pitch/tuning';
import { techniqueSchema } from '#shared/study/study.document';
import type { Partial, VoiceSound } from '#shared/voicing/analysis';
import { analyseChord } from '#shared/voicing/analysis';
import { balanceOf } from '#shared/voicing/balance';
import { characterOf, opennessOf, rootClarity } from '#shared/voicing/character';
import { commonFundamental, LOWER_LIMIT_OF_PITCH } from '#shared/voicing/common-fundamental';
import { densityOfChord } from '#shared/voicing/density';
import { chordOf, EVEN_SETTINGS, voicing } from '../../../support/voicings';

function sounding(id: string, pitch: string, midi: number, partials: readonly Partial[]): VoiceSound {
  return {
    id,
    section: 'cello',
    pitch,
    midi,
    players: 1,
    technique: techniqueSchema.parse({}),
    dynamic: 'mf',
    partials,
  };
}
const pure = (frequencyHz: number, levelDb: number): readonly Partial[] => [{ n: 1, frequencyHz, levelDb }];

describe('the common fundamental', () => {
  it.each([
    ['P5', 2],
    ['M3', 4],
    ['m3', 5],
    ['M6', 3],
  ])(
    'when %s stands on its limit, then its fundamental lies near the lower limit of pitch, 26 to 29 Hz',
    (name, multiple) => {
      const limit = LOW_INTERVAL_LIMITS.find(({ interval }) => interval === name);
      const lower = equalTempered(limit?.lowestMidi ?? 0, 440);
      const upper = equalTempered((limit?.lowestMidi ?? 0) + (limit?.semitones ?? 0), 440);
      const found = commonFundamental([lower, upper]);
      expect(found?.multiples[0]).toBe(multiple);
      expect(found?.frequencyHz).toBeGreaterThan(26);
      expect(found?.frequencyHz).toBeLessThan(LOWER_LIMIT_OF_PITCH);
    },
  );

  it('when notes are whole multiples, then the fundamental is found exactly; a single note is its own', () => {
    expect(commonFundamental([400, 500, 600])).toEqual({ frequencyHz: 100, multiples: [4, 5, 6] });
    expect(commonFundamental([220])).toEqual({ frequencyHz: 220, multiples: [1] });
  });

  it('when there is no note, or no simple ratio, then there is none', () => {
    expect(commonFundamental([])).toBeNull();
    expect(commonFundamental([100, 100 * 2 ** (0.5 / 12)])).toBeNull();
  });
});

describe('character', () => {
  it('when two pure tones are equally loud, then weight and brightness are their means', () => {
    const { weight, brightnessHz } = characterOf(
      [sounding('a', 'A3', 57, pure(220, 0)), sounding('b', 'A4', 69, pure(440, 0))],
      440,
    );
    expect(weight).toBeCloseTo(63, 9);
    expect(brightnessHz).toBeCloseTo(330, 9);
  });

  it('when one tone is 10 dB louder, then it weighs ten times', () => {
    const { weight } = characterOf(
      [sounding('a', 'A3', 57, pure(220, 10)), sounding('b', 'A4', 69, pure(440, 0))],
      440,
    );
    expect(weight).toBeCloseTo((57 * 10 + 69) / 11, 9);
  });

  it('when intervals narrow upwards, then openness favours the bottom', () => {
    expect(opennessOf([52, 36, 43])).toBeCloseTo((7 + 9 / 2) / 1.5, 12);
    expect(opennessOf([36, 36])).toBeNull();
    expect(opennessOf([36, 48, 52])).toBeGreaterThan(opennessOf([36, 40, 52]) ?? Infinity);
  });

  it('when a chord has no notes, then there is nothing to say', () => {
    expect(characterOf([], 440)).toEqual({
      weight: null,
      spread: 0,
      openness: null,
      brightnessHz: null,
      fundamental: null,
      root: null,
    });
  });

  it('when a major triad stands on its root, then root and bass have one support, 10 + 5 + 3 of 63; inverted less', () => {
    expect(rootClarity([48, 52, 55])).toMatchObject({ root: 0, rootSupport: 18 / 63, bassSupport: 18 / 63 });
    expect(rootClarity([52, 55, 60])).toMatchObject({ root: 0, rootSupport: 18 / 63, bassSupport: 10 / 63 });
  });

  it('when a chord is spread wider, then its spread says so', () => {
    const { voices } = analyseChord(voicing('C2 G2 E3 C4 G4'), EVEN_SETTINGS);
    expect(characterOf(voices, 440).spread).toBe(31);
  });
});

describe('register density', () => {
  it('when a partial lies 20 dB under another in its band, or under the threshold in quiet, then it is not counted', () => {
    const partials: readonly Partial[] = [
      { n: 1, frequencyHz: 1000, levelDb: 0 },
      { n: 2, frequencyHz: 1001, levelDb: -20 },
      { n: 3, frequencyHz: 1002, levelDb: -19 },
      { n: 4, frequencyHz: 3000, levelDb: -70 },
    ];
    const { bands, registers } = densityOfChord([sounding('a', 'B5', 83, partials)], 440);
    expect(bands).toHaveLength(1);
    expect(bands[0]).toMatchObject({ band: 15, partials: 2 });
    expect(bands[0]?.levelDb).toBeCloseTo(10 * Math.log10(1 + 10 ** -1.9), 9);
    expect(registers.find(({ register }) => register === 'two-line')?.partials).toBe(2);
    expect(registers.find(({ register }) => register === 'great')).toEqual({
      register: 'great',
      partials: 0,
      levelDb: null,
    });
  });

  it('when a chord sounds, then bands and registers count the same partials', () => {
    const { voices } = analyseChord(voicing('C2 E2 G2 C3'), EVEN_SETTINGS);
    const { bands, registers } = densityOfChord(voices, 440);
    const count = (figures: readonly { partials: number }[]) =>
      figures.reduce((sum, { partials }) => sum + partials, 0);
    expect(count(bands)).toBe(count(registers));
    expect(count(bands)).toBeGreaterThan(50);
  });
});

describe('balance', () => {
  it('when a voice is masked in its only band, then it is covered; the louder one is heard', () => {
    const { voices } = balanceOf([
      sounding('loud', 'A4', 69, pure(440, 30)),
      sounding('soft', 'A4', 69, pure(441, 5)),
    ]);
    expect(voices).toEqual([
      { id: 'loud', heard: 1, covered: false },
      { id: 'soft', heard: 0, covered: true },
    ]);
  });

  it('when nothing masks a voice but itself, then it is not covered', () => {
    const partials: readonly Partial[] = [
      { n: 1, frequencyHz: 440, levelDb: 30 },
      { n: 2, frequencyHz: 445, levelDb: 0 },
    ];
    expect(balanceOf([sounding('alone', 'A4', 69, partials)]).voices[0]?.heard).toBe(1);
  });

  it('when one tone has one soft player against sections, then it is thin, and its players are told', () => {
    const { voices } = analyseChord(
      chordOf([
        { pitch: 'C3', section: 'cello', players: 8 },
        { pitch: 'E4', section: 'viola', players: 1, dynamic: 'pp' },
        { pitch: 'G4', section: 'violin1', players: 12 },
        { pitch: 'C5', section: 'violin2', players: 12 },
      ]),
      EVEN_SETTINGS,
    );
    const tones = balanceOf(voices).tones;
    expect(tones.map(({ tone, players }) => [tone, players])).toEqual([
      ['C', 20],
      ['E', 1],
      ['G', 12],
    ]);
    expect(tones.find(({ tone }) => tone === 'E')?.standing).toBe('thin');
  });

  it('when there is only one tone, then it stands against nothing', () => {
    expect(balanceOf([sounding('a', 'A4', 69, pure(440, 0))]).tones[0]).toMatchObject({
      levelDb: null,
      standing: 'even',
    });
  });
});
