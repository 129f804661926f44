import { describe, expect, it } from 'vitest';
import { chanceOf, countAnswers, newRound, numberOf, sideOf } from '#shared/voicing/blind-rounds';
import { answerText, countText, revealText } from '#shared/voicing/blind-rounds.sentences';

const NAMES = { held: 'A', now: 'B' };

describe('a blind round', () => {
  it('when it begins, then chance says which voicing is called 1', () => {
    expect(newRound(0.49).first).toBe('held');
    expect(newRound(0.5).first).toBe('now');
  });

  it('when 1 is the voicing now, then 2 is the one held, both ways', () => {
    const round = { first: 'now' } as const;
    expect([sideOf(round, 1), sideOf(round, 2)]).toEqual(['now', 'held']);
    expect([numberOf(round, 'now'), numberOf(round, 'held')]).toEqual([1, 2]);
  });

  it('when rounds are counted, then those without a choice stand apart', () => {
    const answers = (['now', 'now', 'held', null] as const).map((clearer) => ({
      first: 'held' as const,
      clearer,
    }));
    expect(countAnswers(answers)).toEqual({ rounds: 3, undecided: 1, held: 1, now: 2 });
  });
});

describe('how far guessing goes', () => {
  // The two-sided sign test: 2 · Σ C(n, k) / 2ⁿ, worked out by hand from Pascal's triangle.
  it.each([
    [1, 1, 1],
    [3, 3, 2 / 8],
    [6, 6, 2 / 64],
    [5, 6, 14 / 64],
    [3, 6, 1],
    [9, 10, 22 / 1024],
  ])('when %d of %d rounds went one way, then the chance is %d', (most, rounds, chance) => {
    expect(chanceOf(most, rounds)).toBeCloseTo(chance, 12);
  });

  it('when the count is no larger count of its rounds, then it is refused', () => {
    expect(() => chanceOf(1, 6)).toThrow(RangeError);
    expect(() => chanceOf(7, 6)).toThrow(RangeError);
    expect(() => chanceOf(0, 0)).toThrow(RangeError);
  });
});

describe('a blind round in words', () => {
  it('when it is answered, then the reader is told which was which and what the index says', () => {
    const answer = { first: 'now', clearer: 'now' } as const;
    expect(revealText(answer, NAMES)).toBe('1 was B, 2 was A.');
    expect(answerText(answer, { held: 60, now: 20, clear: true }, NAMES)).toBe(
      'You called 1 clearer: that is B. The index says the same.',
    );
    expect(answerText(answer, { held: 20, now: 60, clear: true }, NAMES)).toBe(
      'You called 1 clearer: that is B. The index finds A clearer; it is a model, and ears come first.',
    );
    expect(answerText({ first: 'held', clearer: null }, { held: 20, now: 21, clear: false }, NAMES)).toBe(
      'You heard neither as clearer. The index finds no clear difference.',
    );
  });

  it('when five of six rounds went one way, then the chance level is named', () => {
    expect(countText({ rounds: 6, undecided: 0, held: 1, now: 5 }, NAMES)).toBe(
      'B was called clearer in 5 of 6 rounds. By guessing alone one of the two comes out so often, or oftener, in 22 % of tries.',
    );
  });

  it('when there are few rounds, or none, or an even count, then no more is claimed than there is', () => {
    expect(countText({ rounds: 0, undecided: 1, held: 0, now: 0 }, NAMES)).toBe(
      'No round with a choice yet. 1 round without a choice, not counted.',
    );
    expect(countText({ rounds: 1, undecided: 0, held: 1, now: 0 }, NAMES)).toBe(
      'A was called clearer in 1 of 1 round. By guessing alone one of the two comes out so often, or oftener, in 100 % of tries.' +
        ' Go on to 6 rounds before you trust it.',
    );
    expect(countText({ rounds: 6, undecided: 0, held: 3, now: 3 }, NAMES)).toBe(
      'Each was called clearer in 3 of 6 rounds, as guessing gives on the average.',
    );
  });
});
