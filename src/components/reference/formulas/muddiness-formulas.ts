import type { Formula } from '@/components/reference/formulas/formula';
import {
  call,
  negative,
  over,
  power,
  product,
  quotient,
  size,
  sum,
  symbol,
} from '@/components/reference/formulas/expression';

const y = symbol('y');
const f = symbol('f');
const d = symbol('d');
const g = symbol('g');
const h = symbol('h');
const rho = symbol('ρ');
const m = symbol('m');
const [a1, a2] = [symbol('a', '1'), symbol('a', '2')];
const [b1, b2] = [symbol('b', '1'), symbol('b', '2')];
const [f1, f2] = [symbol('f', '1'), symbol('f', '2')];
const fusion = symbol('F');
const pairs = 'pairs of partials';

/** The index in the order in which it is made: from two partials to the figure. The tests hold these to it. */
export const MUDDINESS_FORMULAS: readonly Formula[] = [
  {
    ...{
      id: 'distance',
      says: 'How far apart two partials stand',
      unit: 'equivalent rectangular bandwidths',
    },
    left: y,
    right: quotient(size(sum(f2, negative(f1))), symbol('ERB')),
    where: 'ERB at the mean of the two frequencies',
  },
  {
    ...{ id: 'clouding', says: 'How much two partials cloud each other', unit: '0 to 1', left: g },
    right: power(
      product(quotient(y, symbol('p')), call('exp', sum(1, negative(quotient(y, symbol('p')))))),
      symbol('s'),
    ),
    where: 'nothing from the reach on; after the form of Parncutt’s curve for Hutchinson & Knopoff 1978',
  },
  {
    ...{ id: 'fusion', says: 'How far the partials of two voices coincide and fuse', left: fusion },
    right: over(pairs, product(b1, b2, call('exp', negative(power(quotient(y, symbol('c')), 2))))),
    where:
      'b, the weights of an ideal series, 1/n, the squares of each voice’s adding up to 1: notes fuse by their ' +
      'pitches, whatever plays them',
  },
  {
    ...{ id: 'pair', says: 'What two voices cloud, each contribution at the mean of its two partials' },
    left: symbol('r'),
    right: quotient(over(pairs, product(a1, a2, g)), sum(1, product(symbol('κ'), fusion))),
    where:
      'a, the amplitudes, the squares of each voice’s adding up to its energy; voices in unison count as one ' +
      'voice of their joint energy',
  },
  {
    ...{ id: 'window', says: 'The smooth window along the pitch axis', left: symbol('W') },
    right: call('exp', negative(product(2, power(quotient(d, symbol('w')), 2)))),
    where: 'd, semitones from the place; w, the width: one for the clouding, one for what sounds there',
  },
  {
    ...{ id: 'turn', says: 'Roughness turns from muddy to harsh as it rises', unit: '1 to 0', left: h },
    right: quotient(1, sum(1, power(quotient(f, symbol('f', 'c')), symbol('q')))),
    where: 'f, the frequency of the place',
  },
  {
    ...{
      id: 'neighbours',
      says: 'How much a voice counts for what sounds around a place',
      left: symbol('v'),
    },
    right: product(quotient(1, 2), sum(1, call('cos', quotient(product(symbol('π'), d), 12)))),
    where: 'd, semitones from its fundamental; nothing beyond an octave',
  },
  {
    ...{ id: 'density', says: 'The clouding density at a place, against what sounds there', left: rho },
    right: product(
      quotient(
        power(over('pairs of voices', power(symbol('(W∗r)'), m)), quotient(1, m)),
        sum(symbol('(W∗E)'), product(symbol('ε'), symbol('Ē'))),
      ),
      h,
    ),
    where:
      'E, the energy of the partials; Ē, the mean energy of the voices around the place, weighted by v and by ' +
      'their energies',
  },
  {
    ...{ id: 'index', says: 'The index of a register', unit: '0 to 100', left: symbol('I') },
    right: product(100, sum(1, negative(power(2, negative(quotient(rho, symbol('T'))))))),
    where: 'ρ at the register’s cloudiest place; the chord’s index is its cloudiest register’s',
  },
];
