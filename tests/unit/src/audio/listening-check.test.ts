import { describe, expect, it } from 'vitest';
import {
  answerCheck,
  beginCheck,
  CHECK_NOTES,
  liesBelowReach,
  trialLevel,
  trialSchedule,
  type CheckNote,
  type CheckState,
} from '@/audio/listening-check';

const DRAWS = [0, 0.3, 0.6, 0.99];

/** Answers as somebody would whose loudspeaker goes down to a note. */
function checkedDownTo(lowest: CheckNote, draw: number, fancies = false): CheckState {
  let state = beginCheck(draw);
  while (!state.isOver) {
    const trial = state.trials[state.index];
    const heard =
      trial?.kind === 'tone' ? CHECK_NOTES.indexOf(trial.note) <= CHECK_NOTES.indexOf(lowest) : fancies;
    state = answerCheck(state, heard);
  }
  return state;
}

describe('the listening check', () => {
  it('when it begins, then the notes go down, with one silence after the first and before the sixth', () => {
    for (const draw of DRAWS) {
      const { trials } = beginCheck(draw);
      expect(trials.flatMap((trial) => (trial.kind === 'tone' ? [trial.note] : []))).toEqual(CHECK_NOTES);
      const silent = trials.findIndex(({ kind }) => kind === 'silence');
      expect(silent).toBeGreaterThanOrEqual(1);
      expect(silent).toBeLessThanOrEqual(4);
    }
  });

  it('when notes are heard down to C3, then that is what is found, wherever the silence comes', () => {
    for (const draw of DRAWS) {
      const { lowest, heardNothing } = checkedDownTo('C3', draw);
      expect(lowest).toBe('C3');
      expect(heardNothing).toBe(false);
    }
  });

  it('when the silence is said to be heard, then the check says so', () => {
    expect(checkedDownTo('E1', 0.3, true).heardNothing).toBe(true);
  });

  it('when a note is not heard once, then it is played again before it counts', () => {
    const once = answerCheck(beginCheck(0.5), false);
    expect(once.isOver).toBe(false);
    expect(once.index).toBe(0);
    expect(answerCheck(once, true).lowest).toBe('C4');
    const twice = answerCheck(once, false);
    expect(twice.isOver).toBe(true);
    expect(twice.lowest).toBeNull();
    expect(answerCheck(twice, true)).toBe(twice);
  });

  it('when every note is heard, then it ends at the lowest', () => {
    expect(checkedDownTo('C1', 0).lowest).toBe('C1');
  });
});

describe('a trial', () => {
  it('when notes go down, then they grow no weaker, begin quietly and stay under full scale', () => {
    const levels = CHECK_NOTES.map(trialLevel);
    expect(levels[0]).toBe(-24);
    for (const [index, level] of levels.entries()) {
      expect(level).toBeGreaterThanOrEqual(levels[index - 1] ?? -Infinity);
      expect(level).toBeLessThan(-3);
    }
  });

  it('when it is a note, then that alone sounds; when it is a silence, then nothing does, for as long', () => {
    const [note] = trialSchedule({ kind: 'tone', note: 'A2' });
    const [silence] = trialSchedule({ kind: 'silence' });
    expect(note?.sounds.flatMap(({ partials }) => partials.map(({ frequencyHz }) => frequencyHz))).toEqual([
      110,
    ]);
    expect(silence?.sounds).toEqual([]);
    expect(silence?.seconds).toBe(note?.seconds);
  });
});

describe('liesBelowReach', () => {
  it('when a chord clouds under the lowest note heard, then it lies below, at the note it does not', () => {
    expect(liesBelowReach(40, { lowest: 'C3' })).toBe(true);
    expect(liesBelowReach(48, { lowest: 'C3' })).toBe(false);
    expect(liesBelowReach(90, { lowest: null })).toBe(true);
  });

  it('when nothing clouds or nothing is known, then nothing lies below', () => {
    expect(liesBelowReach(null, { lowest: 'C3' })).toBe(false);
    expect(liesBelowReach(40, null)).toBe(false);
  });
});
