import { describe, expect, it } from 'vitest';
import { ticksOf, valuesOf } from '#shared/notation/note-values';

const written = (position: number, length: number, beat = 16) =>
  valuesOf(position, length, beat).map(({ sign, dotted }) => `${sign}${dotted ? '.' : ''}`);

describe('lengths as notes', () => {
  it('when a length is one note or a dotted one, then it is written so', () => {
    expect(ticksOf(4, 4)).toBe(64);
    expect(ticksOf(0.25, 16)).toBe(1);
    expect(written(0, 64)).toEqual(['1']);
    expect(written(0, 48)).toEqual(['2.']);
    expect(written(0, 128, 64)).toEqual(['breve']);
  });

  it('when a length is more than one note can write, then tied notes write it', () => {
    // Five quarters; three and a half.
    expect(written(0, 80)).toEqual(['1', '4']);
    expect(written(0, 56)).toEqual(['2.', '8']);
  });

  it('when a length begins off a beat, then it is first filled up to the beat', () => {
    // From the second eighth of a quarter: an eighth, then a half.
    expect(written(8, 40)).toEqual(['8', '2']);
    expect(written(4, 12)).toEqual(['8.']);
  });

  it('when any length is written, then its notes add up to it', () => {
    for (let length = 1; length <= 256; length += 1) {
      for (const position of [0, 3, 8, 16]) {
        const sum = valuesOf(position, length, 16).reduce((total, { ticks }) => total + ticks, 0);
        expect(sum).toBe(length);
      }
    }
  });
});
