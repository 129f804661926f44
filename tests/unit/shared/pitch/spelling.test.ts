import { describe, expect, it } from 'vitest';
import { midiOf, pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import { MODES } from '#shared/study/study.document';

const scale = (key: SpellingKey, steps: readonly number[], from: number) =>
  steps.map((step) => pitchName(spellIn(from + step, key)).slice(0, -1)).join(' ');

const MAJOR = [0, 2, 4, 5, 7, 9, 11];

describe('spelling by key', () => {
  it('when the key is F major, then 46 is B flat and not A sharp', () => {
    expect(spellIn(46, { tonic: 'F', mode: 'major' })).toEqual({ letter: 'B', alteration: -1, octave: 2 });
  });

  it('when a scale belongs to the key, then every letter occurs once', () => {
    expect(scale({ tonic: 'Db', mode: 'major' }, MAJOR, 61)).toBe('Db Eb F Gb Ab Bb C');
    expect(scale({ tonic: 'F#', mode: 'major' }, MAJOR, 66)).toBe('F# G# A# B C# D# E#');
    expect(scale({ tonic: 'Eb', mode: 'minor' }, [0, 2, 3, 5, 7, 8, 10], 63)).toBe('Eb F Gb Ab Bb Cb Db');
    expect(scale({ tonic: 'C', mode: 'locrian' }, [0, 1, 3, 5, 6, 8, 10], 60)).toBe('C Db Eb F Gb Ab Bb');
  });

  it('when the key is minor, then its leading note is raised', () => {
    expect(pitchName(spellIn(56, { tonic: 'A', mode: 'minor' }))).toBe('G#3');
  });

  it('when a note crosses the octave by its spelling, then its octave follows its letter', () => {
    expect(pitchName(spellIn(59, { tonic: 'Gb', mode: 'major' }))).toBe('Cb4');
    expect(pitchName(spellIn(60, { tonic: 'C#', mode: 'major' }))).toBe('B#3');
  });

  it('when spelt in any key, then every key of the keyboard still sounds as itself', () => {
    const tonics = ['C', 'Cb', 'C#', 'F#', 'Gb', 'B', 'Ab', 'D#', 'E', 'Fb', 'B#'];
    for (const tonic of tonics) {
      for (const mode of MODES) {
        for (let midi = 21; midi <= 112; midi += 1) expect(midiOf(spellIn(midi, { tonic, mode }))).toBe(midi);
      }
    }
  });

  it('when the pitch lies between two keys, then it is refused', () => {
    expect(() => spellIn(46.5, { tonic: 'C', mode: 'major' })).toThrow(RangeError);
  });
});
