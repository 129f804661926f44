import { describe, expect, it } from 'vitest';
import { applyMove } from '#shared/study/moved.changes';
import { analyseChord } from '#shared/voicing/analysis';
import { moveText, moveWords } from '#shared/voicing/moves.sentences';
import type { Move } from '#shared/voicing/moves/moves';
import type { WeighedMove } from '#shared/voicing/moves/weighed-moves';
import { weighedMoves } from '#shared/voicing/moves/weighed-moves';
import { differClearly } from '#shared/voicing/uncertainty';
import { chordOf, EVEN_SETTINGS, voicing } from '../../../support/voicings';

const lowThird = voicing('C2 E2 G3 C4 E4');

describe('the weighed moves', () => {
  it('when a move is made, then the chord is judged as the move foretold, in its register too', () => {
    const moves = weighedMoves(lowThird, EVEN_SETTINGS);
    expect(moves.length).toBeGreaterThan(2);
    for (const move of moves) {
      const { muddiness } = analyseChord(applyMove(lowThird, move), EVEN_SETTINGS);
      expect(muddiness.index).toBeCloseTo(move.after, 6);
      const register = muddiness.registers.find((found) => found.register === move.register.register);
      expect(register?.index).toBeCloseTo(move.register.after, 6);
      expect(differClearly(move.before, muddiness.index)).toBe(true);
    }
  });

  it('when the notes that cloud are locked, then none of them is moved', () => {
    const locked = chordOf([
      { pitch: 'C2', players: 8, locked: true },
      { pitch: 'E2', players: 8, locked: true },
      { pitch: 'G4', players: 8 },
    ]);
    expect(weighedMoves(locked, EVEN_SETTINGS)).toEqual([]);
  });

  it('when a chord has no notes, then there are none', () => {
    expect(weighedMoves(chordOf([]), EVEN_SETTINGS)).toEqual([]);
  });
});

describe('a move in words', () => {
  const sounds = [
    { id: 'low', section: 'cello', pitch: 'E2', players: 8 },
    { id: 'top', section: 'violin1', pitch: 'Bb4', players: 1 },
  ] as const;
  const move: Move = { kind: 'octaveUp', ids: ['low'], pitches: ['E3'], section: 'cello' };
  const text = (changed: Partial<Move>): string => moveText({ ...move, ...changed }, sounds, 'english');

  it('when a voice moves, then it is said as a musician would', () => {
    expect(text({})).toBe('The cellos’ E2 an octave up, to E3');
    expect(text({ kind: 'chordTone', pitches: ['C2'] })).toBe('The cellos’ E2 down to C2');
    expect(text({ kind: 'chordTone', pitches: ['Gb2'] })).toBe('The cellos’ E2 up to G♭2');
    expect(text({ kind: 'section', section: 'doubleBass' })).toBe('The cellos’ E2 to the double basses');
    expect(text({ kind: 'leaveOut', pitches: [] })).toBe('The cellos’ E2 left out');
    expect(text({ kind: 'octaveDown', ids: ['top'], pitches: ['Bb3'], section: 'violin1' })).toBe(
      'The first violin’s B♭4 an octave down, to B♭3',
    );
  });

  it('when others are linked to it, then they are said to come with it', () => {
    expect(text({ ids: ['low', 'top'], pitches: ['E3', 'Bb5'] })).toContain('with what is linked to it');
  });

  it('when it is weighed, then chord and register stand before and after, with how sure that is', () => {
    const weighed: WeighedMove = {
      ...{ ...move, before: 92.9, after: 38.6, uncertainty: 4.8, lost: null },
      register: { register: 'great', before: 92.9, after: 11.5 },
    };
    expect(moveWords(weighed, sounds, 'english')).toMatchObject({
      ...{ before: 93, after: 39 },
      detail: 'give or take 5; great octave 93 → 12',
    });
    expect(moveWords({ ...weighed, lost: 'Bb2' }, sounds, 'german').detail).toMatch(/; then nobody plays B$/);
  });
});
