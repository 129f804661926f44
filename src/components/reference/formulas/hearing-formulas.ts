import { SETHARES_PAPER, SETHARES_ROUTINE, type SetharesConstants } from '#shared/hearing/sethares-1993';
import { ROUGHNESS } from '#shared/hearing/roughness-models';
import type { Formula } from '@/components/reference/formulas/formula';
import {
  call,
  negative,
  over,
  power,
  product,
  quotient,
  root,
  sum,
  symbol,
  type Expression,
} from '@/components/reference/formulas/expression';

const f = symbol('f');
const y = symbol('y');
const x = symbol('x');
const [a1, a2] = [symbol('a', '1'), symbol('a', '2')];
const [f1, f2] = [symbol('f', '1'), symbol('f', '2')];
const r = symbol('R');
const pairs = 'pairs';

const GLASBERG_MOORE = 'Glasberg & Moore 1990, Hearing Research 47';
/** As printed; the tests hold every one of these formulas to the function that computes it. */
export const ERB_FORMULAS: readonly Formula[] = [
  {
    ...{ id: 'erb', says: 'Equivalent rectangular bandwidth of the ear’s filter', unit: 'hertz' },
    left: symbol('ERB'),
    right: product(24.7, sum(product(4.37, f), 1)),
    ...{ where: 'f in kilohertz', source: GLASBERG_MOORE },
  },
  {
    ...{ id: 'erb-rate', says: 'How many of them lie below a frequency', unit: 'Cams' },
    left: symbol('E'),
    right: product(21.4, call('lg', sum(product(4.37, f), 1))),
    ...{ where: 'f in kilohertz', source: GLASBERG_MOORE },
  },
];

const HK = ROUGHNESS['hutchinson-knopoff'].source;
export const HUTCHINSON_KNOPOFF_FORMULAS: readonly Formula[] = [
  {
    ...{ id: 'hk-band', says: 'Hutchinson & Knopoff: critical bandwidth at the mean of two partials' },
    ...{ unit: 'hertz', left: symbol('B'), right: product(1.72, power(f, 0.65)) },
    ...{ where: 'f, the mean of the two, in hertz', source: HK },
  },
  {
    ...{ id: 'hk-weight', says: 'Hutchinson & Knopoff: how rough two partials are at a distance' },
    left: symbol('g'),
    right: power(product(quotient(y, 0.25), call('exp', sum(1, negative(quotient(y, 0.25))))), 2),
    where: 'y, their difference in critical bandwidths; beyond 1.2 nothing',
    source: HK,
  },
  {
    ...{ id: 'hk', says: 'Hutchinson & Knopoff: roughness of a chord' },
    left: r,
    right: quotient(over(pairs, product(a1, a2, symbol('g'))), over('partials', power(symbol('a'), 2))),
    where: 'a, amplitudes; their unit drops out',
    source: HK,
  },
];

function curveOf({ rise, fall }: SetharesConstants): Expression {
  return sum(call('exp', negative(product(rise, x))), negative(call('exp', negative(product(fall, x)))));
}

function scaledDistance({ dStar, slope, offset }: SetharesConstants): Expression {
  return product(quotient(dStar, sum(product(slope, f1), offset)), sum(f2, negative(f1)));
}

const scaled = (id: string, author: string, constants: SetharesConstants, source: string): Formula => ({
  ...{ id, says: `${author}: distance of two partials, scaled`, left: x },
  right: scaledDistance(constants),
  ...{ where: 'f, the lower and the higher frequency in hertz', source },
});

/** The routine's finer slope, as Vassilakis takes it over. */
const VASSILAKIS_CURVE: SetharesConstants = {
  ...SETHARES_PAPER,
  slope: SETHARES_ROUTINE.slope,
  offset: SETHARES_ROUTINE.offset,
};
const d = symbol('d');

export const SETHARES_FORMULAS: readonly Formula[] = [
  scaled('sethares-scale', 'Sethares', SETHARES_PAPER, ROUGHNESS.sethares.source),
  {
    ...{ id: 'sethares-curve', says: 'Sethares: dissonance at a distance', left: d },
    right: curveOf(SETHARES_PAPER),
    source: ROUGHNESS.sethares.source,
  },
  {
    ...{ id: 'sethares', says: 'Sethares: roughness of a chord', left: r },
    right: over(pairs, product(call('min', a1, a2), d)),
    where: 'of two amplitudes the smaller counts, as in the author’s later work; the unit scales the result',
    source: ROUGHNESS.sethares.source,
  },
];

export const VASSILAKIS_FORMULAS: readonly Formula[] = [
  scaled('vassilakis-scale', 'Vassilakis', VASSILAKIS_CURVE, ROUGHNESS.vassilakis.source),
  {
    ...{ id: 'vassilakis-pair', says: 'Vassilakis: roughness of two partials', left: symbol('r') },
    right: product(
      power(product(a1, a2), 0.1),
      quotient(1, 2),
      power(quotient(product(2, call('min', a1, a2)), sum(a1, a2)), 3.11),
      d,
    ),
    ...{ where: 'd, the dissonance at their distance as above', source: ROUGHNESS.vassilakis.source },
  },
  {
    ...{ id: 'vassilakis', says: 'Vassilakis: roughness of a chord', left: r },
    right: product(2, over(pairs, symbol('r'))),
    ...{
      where: 'the published sum runs over ordered pairs: each twice',
      source: ROUGHNESS.vassilakis.source,
    },
  },
];

export const ROOT_FORMULAS: readonly Formula[] = [
  {
    ...{ id: 'root-ambiguity', says: 'Parncutt: how unclear the root is', unit: '1 or more' },
    left: symbol('A'),
    right: root(quotient(over('keys', symbol('w')), symbol('w', 'max'))),
    where:
      'w, the support of each of the twelve keys by the notes of the chord; 1 where one key alone is supported',
    source: 'Parncutt 1988, Music Perception 6(1); weights of 2006, Empirical Musicology Review 1(4)',
  },
];
