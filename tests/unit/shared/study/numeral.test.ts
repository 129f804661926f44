import { describe, expect, it } from 'vitest';
import { noteName } from '#shared/pitch/display';
import type { SpellingKey } from '#shared/pitch/spelling';
import { toneName } from '#shared/study/harmony/harmony';
import { readNumeral } from '#shared/study/harmony/numeral';
import { scaleOf } from '#shared/study/harmony/scales';

const C_MAJOR: SpellingKey = { tonic: 'C', mode: 'major' };
const A_MINOR: SpellingKey = { tonic: 'A', mode: 'minor' };
const name = (note: Parameters<typeof toneName>[0]) => noteName({ ...note, octave: 4 }, 'english');

/** The notes from the root up, and what stands lowest. */
function read(text: string, key: SpellingKey): string {
  const found = readNumeral(text, key);
  if (!found || !('harmony' in found)) return 'not read';
  const { root, tones, bass } = found.harmony;
  return `${tones.map((tone) => name(toneName(root, tone))).join(' ')} on ${name(bass)}`;
}

describe('a Roman numeral', () => {
  // Spelt as any textbook of harmony has them.
  it.each([
    ['I', 'C E G on C'],
    ['ii7', 'D F A C on D'],
    ['V7', 'G B D F on G'],
    ['IV6', 'F A C on A'],
    ['bVI', 'A♭ C E♭ on A♭'],
    ['viio7', 'B D F A♭ on B'],
    ['vii°', 'B D F on B'],
    ['viiø7', 'B D F A on B'],
    ['V7/V', 'D F♯ A C on D'],
    ['V6/5/ii', 'A C♯ E G on C♯'],
    ['viio7/V', 'F♯ A C E♭ on F♯'],
    ['I6/4', 'C E G on G'],
    ['I64', 'C E G on G'],
    ['V6/5', 'G B D F on B'],
    ['V4/3', 'G B D F on D'],
    ['V4/2', 'G B D F on F'],
    ['V2', 'G B D F on F'],
    ['bII6', 'D♭ F A♭ on F'],
    ['IV7', 'F A C E on F'],
    ['bVI7', 'A♭ C E♭ G♭ on A♭'],
    ['V9', 'G B D F A on G'],
    ['Vsus4', 'G C D on G'],
    ['Imaj7', 'C E G B on C'],
    ['III+', 'E G♯ B♯ on E'],
  ])('when %s stands in C major, then it is %s', (numeral, expected) => {
    expect(read(numeral, C_MAJOR)).toBe(expected);
  });

  it.each([
    ['i', 'A C E on A'],
    ['VI', 'F A C on F'],
    ['VII', 'G B D on G'],
    ['V7', 'E G♯ B D on E'],
    ['viio7', 'G♯ B D F on G♯'],
    ['iiø7', 'B D F A on B'],
    ['iv6', 'D F A on F'],
    ['V7/VI', 'C E G B♭ on C'],
  ])('when %s stands in A minor, then it is %s', (numeral, expected) => {
    expect(read(numeral, A_MINOR)).toBe(expected);
  });

  it('when a figure cannot be read, then its place is told', () => {
    const found = readNumeral('V8', C_MAJOR);
    expect(found && 'fault' in found && [found.fault.start, found.fault.end]).toEqual([1, 2]);
  });

  it('when the word is no numeral, then there is none', () => {
    expect(readNumeral('Gm7', C_MAJOR)).toBeNull();
  });

  it('when a mode is asked for, then its scale is the one that the example gives', () => {
    expect(scaleOf('dorian')).toEqual([0, 2, 3, 5, 7, 9, 10]);
  });
});
