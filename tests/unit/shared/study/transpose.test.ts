import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { midiOfName } from '#shared/pitch/names';
import type { SpellingKey } from '#shared/pitch/spelling';
import { link } from '#shared/study/joins.changes';
import { newStudy } from '#shared/study/new-study';
import {
  common,
  moveSelected,
  movingWith,
  removeSelected,
  setSelected,
} from '#shared/study/selected.changes';
import { MODES, type Chord } from '#shared/study/study.document';
import { chordsIntoKey, studyBySemitones, studyIntoKey, type Direction } from '#shared/study/transpose';
import { chordOf } from '../../../support/typed-chords';

const C_MAJOR: SpellingKey = { tonic: 'C', mode: 'major' };
const pitches = (chord: Chord | undefined) => chord?.voices.map(({ pitch }) => pitch).join(' ');
const inKey = (line: string, from: SpellingKey, to: SpellingKey, way: Direction = 'nearest') =>
  pitches(chordsIntoKey([chordOf(line)], from, to, way)[0]);

describe('several notes at once', () => {
  const chord = chordOf('DB D2, Vc D3 A3, Va F4');

  it('when they are moved, then they keep their distances and the others stay', () => {
    expect(pitches(moveSelected(chord, ['note-2', 'note-3'], 2, C_MAJOR))).toBe('D2 E3 B3 F4');
  });

  it('when one is linked to another, then both move once', () => {
    const cello = chord.voices[1];
    const linked = cello ? link(chord, 'note-1', cello, 'link-one') : chord;
    expect(pitches(moveSelected(linked, ['note-1', 'note-2'], 1, C_MAJOR))).toBe(
      'Db2 Db3 A3 F4'.replaceAll('Db', 'Eb'),
    );
    expect(movingWith(linked, ['note-1'])).toHaveLength(2);
  });

  it('when one would leave the limits, then none moves', () => {
    expect(moveSelected(chord, ['note-1', 'note-4'], 50, C_MAJOR)).toBe(chord);
  });

  it('when how they are played is set, then what is not named stays', () => {
    const muted = setSelected(chord, ['note-2'], { technique: { mute: true } });
    const both = setSelected(muted, ['note-2', 'note-3'], {
      technique: { contact: 'sulTasto' },
      dynamic: 'pp',
    });
    expect(both.voices[1]?.technique).toMatchObject({ mute: true, contact: 'sulTasto' });
    expect(both.voices[2]?.technique).toMatchObject({ mute: false, contact: 'sulTasto' });
    expect(common(both.voices.slice(1, 3), ({ dynamic }) => dynamic)).toBe('pp');
    expect(common(both.voices.slice(1, 3), ({ technique }) => technique.mute)).toBeNull();
  });

  it('when they are taken away, then the others stay', () => {
    expect(pitches(removeSelected(chord, ['note-1', 'note-3']))).toBe('D3 F4');
  });
});

describe('transposing', () => {
  it.each([
    ['DB C2, Vc E3, Va G3', C_MAJOR, { tonic: 'Eb', mode: 'major' }, 'Eb2 G3 Bb3'],
    ['Va F#4', C_MAJOR, { tonic: 'F', mode: 'major' }, 'B4'],
    ['Va Eb4 Ab4', C_MAJOR, { tonic: 'E', mode: 'major' }, 'G4 C5'],
    ['DB C2, Vc E3, Va G3', C_MAJOR, { tonic: 'A', mode: 'minor' }, 'A1 C3 E3'],
    ['DB C2, Vc E3, Va G3', C_MAJOR, { tonic: 'C', mode: 'minor' }, 'C2 Eb3 G3'],
    ['Vc B3', C_MAJOR, { tonic: 'B', mode: 'major' }, 'A#3'],
    ['Va F#4', { tonic: 'F#', mode: 'major' }, { tonic: 'Gb', mode: 'major' }, 'Gb4'],
    ['Va Gb4', { tonic: 'Gb', mode: 'major' }, { tonic: 'F#', mode: 'major' }, 'F#4'],
  ] as const)('when %s goes into another key, then each keeps its degree', (line, from, to, expected) => {
    expect(inKey(line, from, to)).toBe(expected);
  });

  it('when the way is chosen, then it goes up or down', () => {
    const G = { tonic: 'G', mode: 'major' } as const;
    expect(inKey('Va C4', C_MAJOR, G, 'up')).toBe('G4');
    expect(inKey('Va C4', C_MAJOR, G, 'down')).toBe('G3');
    expect(inKey('Va C4', C_MAJOR, G)).toBe('G3');
  });

  const keys = fc.record({
    tonic: fc.constantFrom('C', 'Db', 'D', 'Eb', 'E', 'F', 'F#', 'G', 'Ab', 'A', 'Bb', 'B'),
    mode: fc.constantFrom(...MODES),
  });

  it('when the mode stays, then every interval sounds as before', () => {
    const chord = chordOf('DB C2, Vc Eb3 F#3, Va Bb3, Vn2 D4, Vn1 Ab4');
    const sounding = ({ voices }: Chord) => {
      const [first, ...rest] = voices.map(({ pitch }) => midiOfName(pitch));
      return rest.map((midi) => midi - (first ?? midi));
    };
    fc.assert(
      fc.property(keys, keys, (from, { tonic }) => {
        const to = { ...from, tonic };
        const [there] = chordsIntoKey([chord], from, to, 'nearest');
        expect(there && sounding(there)).toEqual(sounding(chord));
      }),
    );
  });

  it('when the whole study goes, then its key goes with it', () => {
    const study = { ...newStudy('chord-1'), chords: [chordOf('Va C4'), chordOf('Va E4')] };
    const moved = studyIntoKey(study, { tonic: 'D', mode: 'major' }, 'up');
    expect(moved.key.tonic).toBe('D');
    expect(moved.chords.map(pitches)).toEqual(['D4', 'F#4']);
    expect(studyBySemitones(study, 12).chords.map(pitches)).toEqual(['C5', 'E5']);
  });

  it('when a note would leave the limits, then nothing moves', () => {
    const study = { ...newStudy('chord-1'), chords: [chordOf('Va C4'), chordOf('Va C8')] };
    expect(studyBySemitones(study, 12)).toBe(study);
  });
});
