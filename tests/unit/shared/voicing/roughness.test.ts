import { expect, test } from 'vitest';
import { analyseChord } from '#shared/voicing/analysis';
import { pureTonesOf, roughnessOf } from '#shared/voicing/roughness';
import { EVEN_SETTINGS, voicing } from '../../../support/voicings';

const A4_HZ = EVEN_SETTINGS.a4Hz;
const soundsOf = (names: string) => analyseChord(voicing(names), EVEN_SETTINGS).voices;

test('when A4 and A5 sound, then A5 and the second partial of A4 are one tone', () => {
  const sounds = soundsOf('A4 A5');
  const tones = pureTonesOf(sounds, A4_HZ);
  // A4 is 440 Hz, ISO 16:1975, and its second partial 880.
  expect(tones.filter(({ frequencyHz }) => Math.abs(frequencyHz - 880) < 1e-3)).toHaveLength(1);
  const places = sounds.flatMap(({ partials }) =>
    partials.map(({ frequencyHz }) => Math.round(frequencyHz / 440)),
  );
  expect(tones).toHaveLength(new Set(places).size);
});

test('when tones are made, then the loudest has amplitude 1 and 20 dB less is a tenth of it', () => {
  const partials = [
    { n: 1, frequencyHz: 440, levelDb: 7 },
    { n: 2, frequencyHz: 880, levelDb: -13 },
  ];
  const amplitudes = pureTonesOf([{ partials }], A4_HZ).map(({ amplitude }) => amplitude);
  expect(amplitudes[0]).toBeCloseTo(1, 12);
  expect(amplitudes[1]).toBeCloseTo(0.1, 12);
});

test('when a minor second and an octave are measured, then every model calls the second rougher', () => {
  const second = roughnessOf(soundsOf('C4 C#4'), A4_HZ);
  const octave = roughnessOf(soundsOf('C4 C5'), A4_HZ);
  expect(second['hutchinson-knopoff']).toBeGreaterThan(octave['hutchinson-knopoff']);
  expect(second.sethares).toBeGreaterThan(octave.sethares);
  expect(second.vassilakis).toBeGreaterThan(octave.vassilakis);
});

test('when all levels rise alike, then no figure moves', () => {
  const sounds = soundsOf('C3 E3 G3');
  const louder = sounds.map(({ partials }) => ({
    partials: partials.map((partial) => ({ ...partial, levelDb: partial.levelDb + 12 })),
  }));
  const figures = roughnessOf(louder, A4_HZ);
  for (const [model, value] of Object.entries(roughnessOf(sounds, A4_HZ))) {
    expect(Object.entries(figures).find(([name]) => name === model)?.[1]).toBeCloseTo(value, 9);
  }
});

test('when there are no voices, then there is no roughness', () => {
  expect(pureTonesOf([], A4_HZ)).toEqual([]);
  expect(roughnessOf([], A4_HZ)).toEqual({ 'hutchinson-knopoff': 0, sethares: 0, vassilakis: 0 });
});
