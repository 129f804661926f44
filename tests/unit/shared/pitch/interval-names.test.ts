import { describe, expect, it } from 'vitest';
import { intervalName, shortIntervalName, withArticle } from '#shared/pitch/interval-names';
import { parsePitch, type Pitch } from '#shared/pitch/names';

function pitch(name: string): Pitch {
  const parsed = parsePitch(name);
  if (!parsed) throw new Error(name);
  return parsed;
}

describe('names of intervals', () => {
  it.each([
    ['A2', 'F3', 'minor sixth', 'min 6th'],
    ['C2', 'E2', 'major third', 'maj 3rd'],
    ['C2', 'G2', 'fifth', '5th'],
    ['C2', 'F#2', 'augmented fourth', 'aug 4th'],
    ['C2', 'Gb2', 'diminished fifth', 'dim 5th'],
    ['B2', 'C3', 'minor second', 'min 2nd'],
    ['Eb2', 'F#2', 'augmented second', 'aug 2nd'],
    ['C2', 'C3', 'octave', '8ve'],
    ['D2', 'F3', 'minor tenth', 'min 10th'],
    ['C2', 'C4', 'two octaves', '15th'],
    ['C2', 'C2', 'unison', 'unison'],
    ['C2', 'E4', '28 semitones', '28 st'],
    ['B#2', 'C3', 'diminished second', 'dim 2nd'],
  ])('when %s and %s sound, then it is a %s', (a, b, name, short) => {
    expect(intervalName(pitch(a), pitch(b))).toBe(name);
    expect(intervalName(pitch(b), pitch(a))).toBe(name);
    expect(shortIntervalName(pitch(a), pitch(b))).toBe(short);
  });

  it('when it stands in a sentence, then its article fits', () => {
    expect(
      ['octave', 'augmented second', 'unison', 'fifth', 'eleventh', 'two octaves'].map(withArticle),
    ).toEqual(['an octave', 'an augmented second', 'a unison', 'a fifth', 'an eleventh', 'two octaves']);
  });
});
