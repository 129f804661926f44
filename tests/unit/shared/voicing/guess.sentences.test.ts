import { describe, expect, it } from 'vitest';
import { guessTold, levelOf } from '#shared/voicing/guess.sentences';
import { analysisOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

/** Uncertainty 5; the great octave at 72 and the small one within that of it. */
const muddy = analysisOf(chordOf('Vc C2 E2'), {
  registers: { great: { index: 72, at: 40 }, small: { index: 69, at: 50 }, contra: { index: 12, at: 30 } },
});
const clear = analysisOf(chordOf('Vc C3 G3'), { registers: { small: { index: 9, at: 50 } } });

describe('a guess beside the model', () => {
  it('when both agree, then the example holds, and figure and band are told', () => {
    expect(guessTold({ register: 'great', level: 'over' }, muddy)).toEqual({
      guess: 'You: the great octave, over 50.',
      model: 'The model: cloudiest in the great octave, 72, give or take 5.',
      together: 'You and the model hear it alike.',
    });
  });

  it('when another register clouds as much within the uncertainty, then it is as good an answer', () => {
    expect(guessTold({ register: 'small', level: 'over' }, muddy).together).toContain('alike');
    expect(guessTold({ register: 'contra', level: 'over' }, muddy).together).toContain('how much; where');
  });

  it('when it is taken to be clear, then that agrees with a chord that hardly clouds', () => {
    expect(guessTold({ register: 'clear', level: 'under' }, clear).together).toContain('alike');
    expect(guessTold({ register: 'clear', level: 'under' }, muddy).together).toContain('part here');
  });

  it('when they differ, then nobody is called wrong', () => {
    for (const register of ['great', 'contra', 'clear'] as const) {
      for (const level of ['under', 'about', 'over'] as const) {
        const told = Object.values(guessTold({ register, level }, muddy)).join(' ');
        expect(told).not.toMatch(/wrong|right|correct|mistake|false/i);
      }
    }
  });

  it('when 50 lies within the uncertainty, then the figure is about 50', () => {
    expect([levelOf(44, 2), levelOf(46, 2), levelOf(54, 2), levelOf(56, 2), levelOf(59, 10)]).toEqual([
      ...['under', 'about', 'about', 'over', 'about'],
    ]);
  });
});
