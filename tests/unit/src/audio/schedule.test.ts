import { describe, expect, it } from 'vitest';
import {
  buildSchedule,
  endOf,
  progressionSchedule,
  sounding,
  startingBetween,
  strikeSchedule,
} from '@/audio/schedule';
import { voiceSound } from '../../../support/sounds';

function chord(chordId: string, beats: number) {
  return { chordId, beats, sounds: [voiceSound(`${chordId}-voice`)] };
}

describe('progressionSchedule', () => {
  it('when the tempo is 120, then four beats last two seconds and the next chord follows at once', () => {
    const schedule = progressionSchedule([chord('one', 4), chord('two', 2), chord('three', 1)], 120);
    expect(schedule.map(({ key, startSeconds, seconds }) => [key, startSeconds, seconds])).toEqual([
      ['one', 0, 2],
      ['two', 2, 1],
      ['three', 3, 0.5],
    ]);
    expect(endOf(schedule)).toBe(3.5);
  });

  it('when two hundred short chords go by, then the last one still stands on its beat', () => {
    const chords = Array.from({ length: 200 }, (_, index) => chord(`chord-${index}`, 0.25));
    expect(progressionSchedule(chords, 97).at(-1)?.startSeconds).toBeCloseTo((199 * 0.25 * 60) / 97, 9);
  });

  it('when the tempo is 0 or no number, then it is refused', () => {
    expect(() => progressionSchedule([chord('one', 4)], 0)).toThrow(RangeError);
    expect(() => progressionSchedule([chord('one', 4)], NaN)).toThrow(RangeError);
  });
});

describe('handing over', () => {
  it('when the schedule is handed over piece by piece, then every chord is handed over once', () => {
    const chords = Array.from({ length: 30 }, (_, index) => chord(`chord-${index}`, 1));
    const schedule = progressionSchedule(chords, 133);
    const edges = [0, 1.5, 1.55, 4, 4, 9, 30];
    const handed = edges
      .slice(1)
      .flatMap((until, index) => startingBetween(schedule, edges[index] ?? 0, until))
      .map(({ key }) => key);
    expect(handed).toEqual(chords.map(({ chordId }) => chordId));
  });

  it('when a moment is asked for, then the chord that sounds at it answers, and none after the end', () => {
    const schedule = progressionSchedule([chord('one', 1), chord('two', 1)], 60);
    expect(sounding(schedule, 0)?.key).toBe('one');
    expect(sounding(schedule, 1)?.key).toBe('two');
    expect(sounding(schedule, 2)).toBeNull();
    expect(sounding(schedule, -0.1)).toBeNull();
  });
});

describe('one chord', () => {
  const voices = [
    voiceSound('top', { midi: 69 }),
    voiceSound('bass', { midi: 38 }),
    voiceSound('mid', { midi: 53 }),
  ];

  it('when it is struck, then all voices begin together', () => {
    const [struck, ...more] = strikeSchedule(voices);
    expect(struck?.sounds).toEqual(voices);
    expect(struck?.startSeconds).toBe(0);
    expect(more).toEqual([]);
  });

  it('when it is built up, then the lowest begins, the others join upwards and all end together', () => {
    const schedule = buildSchedule(voices);
    expect(schedule.map(({ key }) => key)).toEqual(['bass', 'mid', 'top']);
    const starts = schedule.map(({ startSeconds }) => startSeconds);
    expect(starts[0]).toBe(0);
    expect(starts).toEqual([...starts].sort((a, b) => a - b));
    const ends = schedule.map(({ startSeconds, seconds }) => startSeconds + seconds);
    ends.forEach((end) => expect(end).toBeCloseTo(endOf(schedule), 9));
  });

  it('when it has no notes, then nothing is built up', () => {
    expect(buildSchedule([])).toEqual([]);
    expect(endOf([])).toBe(0);
  });
});
