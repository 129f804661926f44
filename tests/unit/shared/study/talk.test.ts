import { describe, expect, it } from 'vitest';
import type { Anchor, Annotation } from '#shared/contracts/annotations';
import { remarksByChord, remarksOn } from '#shared/study/talk';

function remark(id: string, anchor: Anchor, writtenAt: string): Annotation {
  return { id, anchor, writtenAt, text: id, authorName: 'Ada Fenn', mine: false };
}

const REMARKS = [
  remark('late', { kind: 'chord', chordId: 'chord-a' }, '2026-03-01T12:00:00.000Z'),
  remark('whole', { kind: 'study' }, '2026-03-01T11:00:00.000Z'),
  remark('early', { kind: 'chord', chordId: 'chord-a' }, '2026-03-01T10:00:00.000Z'),
  remark('other', { kind: 'chord', chordId: 'chord-b' }, '2026-03-01T09:00:00.000Z'),
];

describe('the talk', () => {
  it('when a chord is in view, then what was said of it stands newest last', () => {
    expect(remarksOn(REMARKS, 'chord-a').map(({ id }) => id)).toEqual(['early', 'late']);
  });

  it('when no chord is named, then it is what was said of the whole', () => {
    expect(remarksOn(REMARKS, null).map(({ id }) => id)).toEqual(['whole']);
  });

  it('when chords are marked, then each with the number of its remarks', () => {
    expect([...remarksByChord(REMARKS)]).toEqual([
      ['chord-a', 2],
      ['chord-b', 1],
    ]);
  });
});
