import { describe, expect, it } from 'vitest';
import { MUDDINESS_CONSTANTS } from '#shared/data/muddiness-constants';
import { erbAt, erbRate } from '#shared/hearing/erb';
import {
  criticalBandwidth,
  hutchinsonKnopoff1978,
  pairWeight,
} from '#shared/hearing/hutchinson-knopoff-1978';
import { dissonanceCurve, sethares1993 } from '#shared/hearing/sethares-1993';
import { vassilakis2001 } from '#shared/hearing/vassilakis-2001';
import { windowValue } from '#shared/voicing/muddiness/axis';
import { muddinessModel } from '#shared/voicing/muddiness/model';
import { indexOf } from '#shared/voicing/muddiness/scores';
import { neighbourWeight } from '#shared/voicing/muddiness/tables';
import { cloudingAt, distanceErb } from '#shared/voicing/muddiness/tones';
import { evaluate, over, quotient, symbol } from '@/components/reference/formulas/expression';
import {
  ERB_FORMULAS,
  HUTCHINSON_KNOPOFF_FORMULAS,
  SETHARES_FORMULAS,
  VASSILAKIS_FORMULAS,
} from '@/components/reference/formulas/hearing-formulas';
import { MUDDINESS_FORMULAS } from '@/components/reference/formulas/muddiness-formulas';

const SHOWN = [
  ...ERB_FORMULAS,
  ...HUTCHINSON_KNOPOFF_FORMULAS,
  ...SETHARES_FORMULAS,
  ...VASSILAKIS_FORMULAS,
  ...MUDDINESS_FORMULAS,
];

function shown(id: string, values: Readonly<Record<string, number>>): number {
  const formula = SHOWN.find((known) => known.id === id);
  if (!formula) throw new Error(`no formula ${id}`);
  return evaluate(formula.right, values);
}

const c = MUDDINESS_CONSTANTS;
const DIGITS = 10;

describe('a formula', () => {
  it('when it is worked out, then symbols take their values', () => {
    expect(evaluate(quotient(symbol('f'), 2), { f: 10 })).toBe(5);
  });

  it('when a symbol has no value or only a chord could add it up, then it says so', () => {
    expect(() => evaluate(symbol('f'), {})).toThrow(RangeError);
    expect(() => evaluate(over('pairs', 1), {})).toThrow(RangeError);
  });
});

describe('the formulas of hearing as shown', () => {
  it.each([50, 440, 1000, 4000])(
    'when they are worked out at %i Hz, then they are what is computed',
    (hz) => {
      const f = hz / 1000;
      expect(shown('erb', { f })).toBeCloseTo(erbAt(hz), DIGITS);
      expect(shown('erb-rate', { f })).toBeCloseTo(erbRate(hz), DIGITS);
      expect(shown('hk-band', { f: hz })).toBeCloseTo(criticalBandwidth(hz, hz), DIGITS);
    },
  );

  it('when ERB is worked out at 1 kHz, then it is the value of Glasberg & Moore', () => {
    expect(shown('erb', { f: 1 })).toBeCloseTo(132.639, 3);
  });

  it.each([
    [0.05, 1, 0.5],
    [0.25, 0.4, 0.4],
    [1, 0.2, 0.9],
  ])('when two partials beat, then the roughness formulas are what is computed (%f)', (share, a_1, a_2) => {
    const [f_1, f_2] = [200, 200 * (1 + share / 10)];
    const tones = [
      { frequencyHz: f_1, amplitude: a_1 },
      { frequencyHz: f_2, amplitude: a_2 },
    ];
    const y = (f_2 - f_1) / shown('hk-band', { f: (f_1 + f_2) / 2 });
    const g = shown('hk-weight', { y });
    expect(g).toBeCloseTo(pairWeight(y), DIGITS);
    expect((a_1 * a_2 * g) / (a_1 ** 2 + a_2 ** 2)).toBeCloseTo(hutchinsonKnopoff1978(tones), DIGITS);

    const x = shown('sethares-scale', { f_1, f_2 });
    const d = shown('sethares-curve', { x });
    expect(d).toBeCloseTo(dissonanceCurve(x), DIGITS);
    expect(Math.min(a_1, a_2) * d).toBeCloseTo(sethares1993(tones), DIGITS);

    const ofVassilakis = shown('sethares-curve', { x: shown('vassilakis-scale', { f_1, f_2 }) });
    const r = shown('vassilakis-pair', { a_1, a_2, d: ofVassilakis });
    expect(2 * r).toBeCloseTo(vassilakis2001(tones), DIGITS);
  });
});

describe('the formulas of the index as shown', () => {
  it.each([0.05, c.peakErb, 1, 3])(
    'when partials stand %f bandwidths apart, then g is what is computed',
    (y) => {
      expect(shown('clouding', { y, p: c.peakErb, s: c.sharpness })).toBeCloseTo(cloudingAt(y, c), DIGITS);
    },
  );

  it('when two frequencies are compared, then their distance is what is computed', () => {
    const ERB = shown('erb', { f: 0.11 });
    expect(shown('distance', { f_1: 100, f_2: 120, ERB })).toBeCloseTo(distanceErb(100, 120), DIGITS);
  });

  it.each([-12, -3, 0, 2.75, 11])(
    'when a place lies %f semitones off, then its weights are what is computed',
    (d) => {
      expect(shown('window', { d, w: c.windowSemitones })).toBeCloseTo(
        windowValue(d, c.windowSemitones),
        DIGITS,
      );
      expect(shown('neighbours', { d, π: Math.PI })).toBeCloseTo(neighbourWeight(d), DIGITS);
    },
  );

  it('when roughness rises, then its turn is what is computed all along the axis', () => {
    const { turn } = muddinessModel(c, 440, 0.5);
    // The axis starts at C0 and has two points a semitone: A4 is its point 2 · 57, with margins of a quarter tone.
    const values = [55, 110, 220, 440].map((f) => shown('turn', { f, f_c: c.cornerHz, q: c.slope }));
    for (const value of values) {
      expect(Math.min(...turn.map((h) => Math.abs(h - value)))).toBeLessThan(1e-9);
    }
  });

  it.each([0, 0.02, c.threshold, 0.4])('when ρ is %f, then the index is what is computed', (rho) => {
    expect(shown('index', { ρ: rho, T: c.threshold })).toBeCloseTo(indexOf(rho, c.threshold), DIGITS);
  });
});
