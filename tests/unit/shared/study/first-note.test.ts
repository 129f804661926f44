import { describe, expect, it } from 'vitest';
import { midiOfName } from '#shared/pitch/names';
import { EXAMPLE_CHORDS } from '#shared/study/examples';
import { firstNote } from '#shared/study/first-note';
import { chordOf } from '../../../support/typed-chords';

describe('a section that begins', () => {
  it('when it has no notes, then it begins on its second lowest open string', () => {
    // The cello's strings are C2 G2 D3 A3.
    expect(firstNote('cello', 'four-string', chordOf(''))).toBe(midiOfName('G2'));
  });

  it('when that string sounds already, then the next free one follows', () => {
    expect(firstNote('cello', 'four-string', chordOf('Vc G2, Va D3'))).toBe(midiOfName('D3'));
    expect(firstNote('cello', 'four-string', chordOf('Vc G2 D3 A3'))).toBe(midiOfName('C2'));
  });
});

describe('the example chords', () => {
  it('when they are put on the bench, then each can be read', () => {
    for (const { line } of EXAMPLE_CHORDS) expect(chordOf(line).voices.length).toBeGreaterThan(4);
  });
});
