import { describe, expect, it } from 'vitest';
import type { DraftDocument } from '#shared/study/draft';
import { emptyChord, newStudy, newVoice } from '#shared/study/new-study';
import { differencesOf, sameStudy } from '#shared/study/study.differences';

function study(...chordIds: string[]): DraftDocument {
  return { ...newStudy('unused-chord'), chords: chordIds.map(emptyChord) };
}

function withNote(document: DraftDocument, chordId: string, pitch: string): DraftDocument {
  const voices = [newVoice('voice-one', 'cello', pitch)];
  return {
    ...document,
    chords: document.chords.map((chord) => (chord.id === chordId ? { ...chord, voices } : chord)),
  };
}

describe('differencesOf', () => {
  it('when both say the same with their keys in another order, then there is none', () => {
    const mine = study('chord-a');
    const theirs: DraftDocument = { ...mine, key: { mode: 'major', tonic: 'C' } };
    expect(sameStudy(mine, theirs)).toBe(true);
    expect(differencesOf(mine, theirs)).toEqual({ settings: [], chords: [], reordered: false });
  });

  it('when one chord has another note, then that chord alone is named, with its place in both', () => {
    const base = study('chord-a', 'chord-b');
    const found = differencesOf(withNote(base, 'chord-b', 'A2'), withNote(base, 'chord-b', 'B2'));
    expect(found.chords.map(({ chordId }) => chordId)).toEqual(['chord-b']);
    expect(found.chords[0]?.mine?.place).toBe(2);
    expect(found.chords[0]?.theirs?.chord.voices[0]?.pitch).toBe('B2');
    expect(sameStudy(withNote(base, 'chord-b', 'A2'), withNote(base, 'chord-b', 'B2'))).toBe(false);
  });

  it('when a chord stands in one of them only, then the other side is empty', () => {
    const found = differencesOf(study('chord-a', 'chord-b'), study('chord-a', 'chord-c'));
    expect(found.chords).toMatchObject([
      { chordId: 'chord-c', mine: null },
      { chordId: 'chord-b', theirs: null },
    ]);
    expect(found.reordered).toBe(false);
  });

  it('when the same chords stand in another order, then only that is said', () => {
    const found = differencesOf(study('chord-a', 'chord-b'), study('chord-b', 'chord-a'));
    expect(found).toEqual({ settings: [], chords: [], reordered: true });
  });

  it('when title and tempo differ, then they are named in words', () => {
    const mine = study('chord-a');
    expect(differencesOf(mine, { ...mine, title: 'Slack water', tempoBpm: 72 }).settings).toEqual([
      'title',
      'tempo',
    ]);
  });
});
