import { describe, expect, it } from 'vitest';
import { mergedText, newsBetween, newsText } from '#shared/study/merged';
import { emptyChord, newStudy } from '#shared/study/new-study';

const NOTHING = { chords: [], settings: [], reordered: false };

describe('what others’ saves brought', () => {
  it('when a chord was added, one changed and one taken away, then each is told by its place', () => {
    const [first, second, third] = ['chord-1', 'chord-2', 'chord-3'].map(emptyChord);
    const before = { ...newStudy('chord-1'), chords: [first, second].flatMap((chord) => chord ?? []) };
    const changed = first ? [{ ...first, beats: 2, name: 'ebb' }] : [];
    const after = { ...before, tempoBpm: 90, chords: [...changed, ...(third ? [third] : [])] };
    const news = newsBetween(before, after);
    expect(newsText(news)).toBe('chord 1, “ebb”, changed, chord 2 added, chord 2 removed and tempo changed');
  });

  it('when chords were only moved, then that is told', () => {
    expect(newsText({ ...NOTHING, reordered: true })).toBe('chords moved');
  });

  it('when it is the reader who saved elsewhere, then it says so', () => {
    expect(mergedText({ ...NOTHING, withNumber: 5, savedByNames: [], settings: ['tempo'] })).toBe(
      'You had saved this study meanwhile in another window or on another machine. Both are kept in one: tempo changed.',
    );
  });

  it('when several others saved, then all are named', () => {
    expect(mergedText({ ...NOTHING, withNumber: 5, savedByNames: ['Ada', 'Ben'], settings: [] })).toBe(
      'Ada and Ben had saved this study meanwhile. Both are kept in one.',
    );
  });

  it('when nothing is new, then there is nothing to tell', () => {
    expect(newsText(NOTHING)).toBe('');
  });
});
