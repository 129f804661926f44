import { describe, expect, it } from 'vitest';
import { presentOrder } from '@/components/present/present-keys';
import {
  beginReveal,
  nextPart,
  REVEAL_PARTS,
  shows,
  stepReveal,
  type Reveal,
} from '@/components/present/reveal';

/** What may be seen. */
const seen = (reveal: Reveal) => REVEAL_PARTS.filter((part) => shows(reveal, part));

describe('uncovering a chord step by step', () => {
  it('when it goes on, then notes, sound, overtones and figures come in this order', () => {
    let reveal = beginReveal(true);
    const steps = [seen(reveal)];
    while (nextPart(reveal)) {
      reveal = stepReveal(reveal, 1);
      steps.push(seen(reveal));
    }
    expect(steps).toEqual([
      ['notes'],
      ['notes', 'sound'],
      ['notes', 'sound', 'overtones'],
      ['notes', 'sound', 'overtones', 'figures'],
    ]);
  });

  it('when it goes back, then the last part is covered again, and the notes stay', () => {
    const whole = { stepwise: true, upTo: 'figures' } as const;
    expect(seen(stepReveal(whole, -1))).toEqual(['notes', 'sound', 'overtones']);
    expect(stepReveal(beginReveal(true), -1)).toEqual(beginReveal(true));
    expect(stepReveal(whole, 1)).toEqual(whole);
  });

  it('when it is not step by step, then all is shown and nothing comes next', () => {
    const reveal = beginReveal(false);
    expect(seen(reveal)).toEqual([...REVEAL_PARTS]);
    expect(nextPart(reveal)).toBeNull();
    expect(stepReveal(reveal, 1)).toEqual(reveal);
  });
});

describe('the keys of the projector', () => {
  const key = (name: string, held: Partial<KeyboardEvent> = {}) =>
    presentOrder({ key: name, ctrlKey: false, altKey: false, metaKey: false, ...held });

  it('when arrows, space and Escape are pressed, then chords change, parts are uncovered, it is left', () => {
    expect(
      ['ArrowRight', 'ArrowLeft', ' ', 'ArrowDown', 'ArrowUp', 'Escape'].map((name) => key(name)),
    ).toEqual([...['next-chord', 'previous-chord', 'reveal', 'reveal', 'cover', 'leave']]);
  });

  it('when a letter is pressed, then its case does not matter; with Control it is the browser’s', () => {
    expect([key('P'), key('p'), key('p', { ctrlKey: true }), key('q')]).toEqual([
      ...['strike', 'strike', null, null],
    ]);
  });
});
