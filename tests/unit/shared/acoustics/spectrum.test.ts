import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { bodyGain } from '#shared/acoustics/body';
import { bowForceLevel, ORDINARY_ROLL_OFF_OCTAVES } from '#shared/acoustics/bow';
import { brightnessGain, nominalLevel, playersGain } from '#shared/acoustics/level';
import { spectrumOf } from '#shared/acoustics/spectrum';
import { techniqueLevel } from '#shared/acoustics/technique';
import { INSTRUMENT_BODIES } from '#shared/data/instrument-bodies';
import type { Instrument } from '#shared/strings/sections';
import type { Technique } from '#shared/study/study.document';
import { techniqueSchema } from '#shared/study/study.document';
import { input, numberOf, numbersOf, publishedRows, toleranceOf } from '../../../support/published';

const ordinary = techniqueSchema.parse({});
const tone = (technique: Partial<Technique>, f0Hz = 220, instrument: Instrument = 'cello') =>
  spectrumOf({ instrument, technique: { ...ordinary, ...technique }, dynamic: 'mf', f0Hz });
/** How much a technique changes a partial, against ordinary bowing. */
const change = (technique: Partial<Technique>, n: number, f0Hz = 220) =>
  (tone(technique, f0Hz)[n - 1]?.levelDb ?? NaN) - (tone({}, f0Hz)[n - 1]?.levelDb ?? NaN);

describe('the bow', () => {
  it('when stick-slip motion is ideal, then partials fall as 1/n (Helmholtz)', () => {
    const [row] = publishedRows('strings', 'string.sawtooth');
    if (!row) throw new Error('missing');
    input(row, 'n', z.array(z.number())).forEach((n, i) =>
      expect(10 ** (bowForceLevel(n) / 20)).toBeCloseTo(numbersOf(row)[i] ?? NaN, 4),
    );
  });

  it('when partials lie beyond 4.2 octaves, then they fall by 12 dB per octave (Schoonderwaldt)', () => {
    const [row] = publishedRows('strings', 'string.rolloff');
    expect(ORDINARY_ROLL_OFF_OCTAVES).toBe(row ? numberOf(row) : NaN);
    expect(bowForceLevel(32) - bowForceLevel(64)).toBeCloseTo(12.04, 2);
    expect(bowForceLevel(8) - bowForceLevel(16)).toBeCloseTo(6.02, 2);
  });
});

describe('the body', () => {
  it('when the violin’s modes are compared with a measured one, then they lie within its tolerance', () => {
    const modes = { A0: INSTRUMENT_BODIES.violin.airHz, B1plus: INSTRUMENT_BODIES.violin.woodHz[1] };
    for (const [name, frequency] of Object.entries(modes)) {
      const [row] = publishedRows('strings', `violin.mode.${name}`);
      if (!row) throw new Error('missing');
      expect(Math.abs(frequency - numberOf(row))).toBeLessThanOrEqual(toleranceOf(row));
    }
  });

  it('when violas and cellos are compared with Hutchins’s rule, then their main modes lie where it says', () => {
    const [air] = publishedRows('strings', 'mode.viola_air');
    const [wood] = publishedRows('strings', 'mode.viola_body');
    const [cello] = publishedRows('strings', 'mode.cello_body');
    if (!air || !wood || !cello) throw new Error('missing');
    const within = (frequency: number, row: typeof air) => {
      const [low = NaN, high = NaN] = numbersOf(row);
      expect(frequency).toBeGreaterThanOrEqual(low - toleranceOf(row));
      expect(frequency).toBeLessThanOrEqual(high + toleranceOf(row));
    };
    within(INSTRUMENT_BODIES.viola.airHz, air);
    within(INSTRUMENT_BODIES.viola.woodHz[0], wood);
    within(INSTRUMENT_BODIES.cello.woodHz[0], cello);
  });

  it('when a note is lower than the air mode, then its fundamental is weak: 12 dB less per octave and more', () => {
    expect(bodyGain('cello', 65.4)).toBeLessThan(bodyGain('cello', 130.8));
    expect(bodyGain('violin', 34) - bodyGain('violin', 17)).toBeGreaterThan(10);
  });

  it('when the gain is taken by hand at 1 kHz on the cello, then it is what the slopes add up to', () => {
    // High-pass, low-pass and the hill alone matter there: the modes lie over eight widths away.
    const expected =
      -10 * Math.log10(1 + (100 / 1000) ** 4) -
      10 * Math.log10(1 + (1000 / 4000) ** 4) +
      6 * Math.exp(-((Math.log2(1000 / 1750) / 0.5) ** 2) / 2);
    expect(bodyGain('cello', 1000)).toBeCloseTo(expected, 3);
  });
});

describe('a tone', () => {
  it('when any tone sounds, then its partials are whole multiples, at most 32, up to 10 kHz, all finite', () => {
    const instruments = fc.constantFrom<Instrument>('violin', 'viola', 'cello', 'doubleBass');
    fc.assert(
      fc.property(instruments, fc.double({ min: 25, max: 4000, noNaN: true }), (instrument, f0Hz) => {
        const partials = tone({}, f0Hz, instrument);
        expect(partials.length).toBe(Math.min(32, Math.floor(10_000 / f0Hz)));
        partials.forEach(({ n, frequencyHz, levelDb }, i) => {
          expect(n).toBe(i + 1);
          expect(frequencyHz).toBeCloseTo(n * f0Hz, 6);
          expect(Number.isFinite(levelDb)).toBe(true);
        });
      }),
    );
  });
});

describe('technique', () => {
  it('when played sul tasto, then partials near the bowing point dip and the top is less', () => {
    expect(change({ contact: 'sulTasto' }, 1)).toBeCloseTo(0, 1);
    expect(change({ contact: 'sulTasto' }, 5)).toBeLessThan(change({ contact: 'sulTasto' }, 3));
    expect(change({ contact: 'sulTasto' }, 5)).toBeLessThan(change({ contact: 'sulTasto' }, 7));
    expect(change({ contact: 'sulTasto' }, 28)).toBeLessThan(-5);
  });

  it('when played sul ponticello, then the fundamental is weaker and the top stronger', () => {
    expect(change({ contact: 'sulPonticello' }, 1)).toBeLessThan(-3);
    expect(change({ contact: 'sulPonticello' }, 20)).toBeGreaterThan(3);
  });

  it('when muted, then 1.5 to 2.5 kHz is lowered most (Mousavion & Sarkar 2015)', () => {
    const middle = change({ mute: true }, 9);
    expect(middle).toBeLessThan(-9);
    expect(change({ mute: true }, 1)).toBeCloseTo(0, 1);
    expect(change({ mute: true }, 30)).toBeGreaterThan(middle);
  });

  it('when tremolo, then the spectrum is the ordinary one', () => {
    expect(tone({ stroke: 'tremolo' })).toEqual(tone({}));
  });

  it('when plucked a fifth of the string away, then the fifth partial is nearly missed and the top is softer', () => {
    const relative = (n: number) => change({ stroke: 'pizzicato' }, n);
    expect(relative(5)).toBeLessThan(relative(4));
    expect(relative(5)).toBeLessThan(relative(6));
    expect(relative(16)).toBeLessThan(-8);
  });

  it('when a harmonic, then partials are fewer and the upper ones weaker by 6 dB an octave', () => {
    const harmonic = tone({ harmonic: 'natural' });
    expect(harmonic.length).toBeLessThan(tone({}).length);
    expect(change({ harmonic: 'natural' }, 4)).toBeCloseTo(-12, 6);
  });

  it('when muted, plucked or over the fingerboard, then the level is lower', () => {
    expect(techniqueLevel(ordinary)).toBe(0);
    expect(techniqueLevel({ ...ordinary, mute: true })).toBeLessThan(0);
    expect(techniqueLevel({ ...ordinary, stroke: 'pizzicato' })).toBeLessThan(0);
    expect(techniqueLevel({ ...ordinary, contact: 'sulTasto' })).toBeLessThan(0);
  });
});

describe('level', () => {
  it.each(publishedRows('strings', 'section.gain').map((row) => [row.id, row] as const))(
    'when %s plays together, then the level grows as of incoherent sources',
    (_, row) => {
      expect(Math.abs(playersGain(input(row, 'N', z.number())) - numberOf(row))).toBeLessThanOrEqual(
        toleranceOf(row),
      );
    },
  );

  it('when a section of ten divides in two, then each line loses 3 dB', () => {
    const whole = nominalLevel('viola', 'mf', ordinary, 10);
    expect(nominalLevel('viola', 'mf', ordinary, 5) - whole).toBeCloseTo(-3.01, 2);
  });

  it('when instruments play alike, then they stand as Meyer’s fortes do: 89, 87, 90, 92 dB', () => {
    const level = (instrument: Instrument) => nominalLevel(instrument, 'f', ordinary, 1);
    expect(level('viola') - level('violin')).toBe(-2);
    expect(level('cello') - level('violin')).toBe(1);
    expect(level('doubleBass') - level('violin')).toBe(3);
  });

  it('when the dynamic grows by a dB, then 3 kHz grows by 1.1 (Meyer) and the bottom by 1', () => {
    expect(brightnessGain('ff', 3000)).toBeCloseTo(1, 12);
    expect(brightnessGain('ff', 100)).toBe(0);
    expect(brightnessGain('mf', 3000)).toBe(0);
    expect(brightnessGain('pp', 3000)).toBeLessThan(0);
  });
});
