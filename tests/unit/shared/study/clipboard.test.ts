import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  clipOfVoices,
  clipTexts,
  pasteChords,
  pasteVoices,
  readClipData,
  readClipText,
} from '#shared/study/clipboard';
import { newStudy } from '#shared/study/new-study';
import { comfortableReach } from '#shared/study/reach';
import { chordSchema, type Chord } from '#shared/study/study.document';
import { typingLineOf } from '#shared/study/typing-line.text';
import { chordOf } from '../../../support/typed-chords';

const reach = comfortableReach('four-string');
const counted = () => {
  let count = 0;
  return () => `made-${(count += 1)}`;
};
const line = (chord: Chord | undefined) => (chord ? typingLineOf(chord, 'english') : null);

describe('the clipboard', () => {
  it('when notes are copied, then the text is the line that would be typed, and both forms are read again', () => {
    const clip = clipOfVoices(chordOf('DB D2, Vc A2[solo pp] F3'), ['note-2', 'note-3']);
    const { text, data } = clipTexts(clip, 'english');
    expect(text).toBe('Vc A2[solo pp] F3');
    expect(readClipData(data)).toEqual(clip);
    const read = readClipText(text, 'english', reach, counted());
    expect(read?.kind).toBe('voices');
    expect(line(read?.chords[0])).toBe(text);
  });

  it('when several lines are pasted, then they are chords', () => {
    const clip = readClipText('Vc A2\n\nVa A3\r\n', 'english', reach, counted());
    expect(clip?.kind).toBe('chords');
    expect(clip?.chords.map(line)).toEqual(['Vc A2', 'Va A3']);
  });

  it('when the text is none of ours, then nothing is read', () => {
    expect(readClipText('Dear all, the rehearsal begins at ten.', 'english', reach, counted())).toBeNull();
    expect(readClipText('', 'english', reach, counted())).toBeNull();
    expect(readClipData('{"siltline":1}')).toBeNull();
    fc.assert(fc.property(fc.string(), (text) => readClipData(text) === null));
  });

  it('when notes are pasted, then they come under new ids, their stops and links among themselves', () => {
    const from = chordOf('Vc D2[link 1]+A2, Va D3[link 1]');
    const clip = clipOfVoices(
      from,
      from.voices.map(({ id }) => id),
    );
    const pasted = pasteVoices(chordOf('Vc C2+G2'), clip, counted());
    expect(line(pasted)).toBe('Vc C2+G2 D2[link 1]+A2, Va D3[link 1]');
    expect(new Set(pasted.voices.map(({ id }) => id)).size).toBe(5);
    expect(chordSchema.parse(pasted)).toEqual(pasted);
  });

  it('when the chord has no room, then it stays as it is', () => {
    const full = chordOf(`Va ${Array.from({ length: 40 }, () => 'A3').join(' ')}`);
    expect(pasteVoices(full, clipOfVoices(chordOf('Vc A2'), ['note-1']), counted())).toBe(full);
  });

  it('when chords are pasted, then they follow the chord in their order', () => {
    const clip = { kind: 'chords' as const, chords: [chordOf('Vc A2'), chordOf('Vc B2')] };
    const { study, lastId } = pasteChords(newStudy('chord-1'), 'chord-1', clip, counted());
    expect(study.chords.map(line)).toEqual(['', 'Vc A2', 'Vc B2']);
    expect(study.chords.at(-1)?.id).toBe(lastId);
  });
});
