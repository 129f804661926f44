import { describe, expect, it } from 'vitest';
import type { DraftDocument } from '#shared/study/draft';
import { newStudy, newVoice } from '#shared/study/new-study';
import { addChordAfter, changeChord } from '#shared/study/study.changes';
import type { Voice } from '#shared/study/study.document';
import { chordBefore } from '@/stores/chord-before';

const ONE = 'chord-one';
const voicesOf = (pitches: readonly string[]): Voice[] =>
  pitches.map((pitch, index) => newVoice(`voice-${index}`, 'cello', pitch));

/** The document with the chord of these notes in the place of what it was. */
const having = (study: DraftDocument, chordId: string, ...pitches: string[]): DraftDocument =>
  changeChord(study, chordId, (chord) => ({ ...chord, voices: voicesOf(pitches) }));

/** The notes before the changes, of a chord that was each of these in turn. */
function before(...states: readonly (readonly string[])[]): readonly string[] | undefined {
  const steps = states.reduce<readonly DraftDocument[]>(
    (led, pitches) => [...led, having(led.at(-1) ?? newStudy(ONE), ONE, ...pitches)],
    [newStudy(ONE)],
  );
  const present = steps.at(-1) ?? newStudy(ONE);
  const found = chordBefore({ past: steps.slice(0, -1), present, chordId: ONE });
  return found?.voices.map(({ pitch }) => pitch);
}

describe('a chord as it was before its changes', () => {
  it('when several changes followed one another, then it is what it was before the first', () => {
    expect(before(['D2', 'F2'], ['D2', 'D3'], ['D2', 'A3'])).toEqual(['D2', 'F2']);
  });

  it('when a note was left out, then it is what it was with that note', () => {
    expect(before(['D2', 'F2', 'A2'], ['D2', 'A2'])).toEqual(['D2', 'F2', 'A2']);
  });

  it('when it was only written, at once or note by note, then there is nothing', () => {
    expect(before(['D2', 'F2'])).toBeUndefined();
    expect(before(['D2'], ['D2', 'F2'], ['D2', 'F2', 'A2'])).toBeUndefined();
  });

  it('when notes were added and then changed, then it is what it was when the last was added', () => {
    expect(before(['D2'], ['D2', 'F2'], ['D2', 'A2'])).toEqual(['D2', 'F2']);
  });

  it('when the same note was added once more, then that too was writing', () => {
    expect(before(['D2'], ['D2', 'D2'])).toBeUndefined();
  });

  it('when the notes are again as they were, then there is nothing', () => {
    expect(before(['D2', 'F2'], ['D2', 'D3'], ['D2', 'F2'])).toBeUndefined();
  });

  it('when its notes were only locked, then there is nothing', () => {
    const first = having(newStudy(ONE), ONE, 'D2', 'F2');
    const present = changeChord(first, ONE, (chord) => ({
      ...chord,
      voices: chord.voices.map((voice) => ({ ...voice, locked: true })),
    }));
    expect(chordBefore({ past: [newStudy(ONE), first], present, chordId: ONE })).toBeNull();
  });

  it('when another chord was changed between, then only what followed that counts', () => {
    const alone = having(newStudy(ONE), ONE, 'D2', 'F2');
    const [chord] = alone.chords;
    if (!chord) throw new Error('no chord');
    const two = addChordAfter(alone, ONE, { ...chord, id: 'chord-two' });
    const opened = having(two, ONE, 'D2', 'A2');
    const other = having(opened, 'chord-two', 'C3');
    const past = [newStudy(ONE), alone, two, opened, other];
    expect(chordBefore({ past, present: other, chordId: ONE })).toBeNull();
    const present = having(other, ONE, 'D2', 'D3');
    const found = chordBefore({ past, present, chordId: ONE });
    expect(found?.voices.map(({ pitch }) => pitch)).toEqual(['D2', 'A2']);
  });
});
