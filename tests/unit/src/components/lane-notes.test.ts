import { describe, expect, it } from 'vitest';
import { midiOfName } from '#shared/pitch/names';
import { DEFAULT_ENSEMBLE } from '#shared/study/study.document';
import { pitchAxis } from '@/charts/pitch-axis';
import { laneNotes } from '@/components/bench/lane-notes';
import { analysisOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

const axis = pitchAxis([], 400, 40);
/** Height of a token where it takes less room. */
const TOKEN = 22;
const [PHONE, DESK] = [43, 90];

function shown(line: string, laneWidth: number) {
  const chord = chordOf(line);
  return laneNotes(
    {
      ...{ chord, analysis: analysisOf(chord), ensemble: DEFAULT_ENSEMBLE, axis },
      ...{ spelling: { tonic: 'C', mode: 'major' }, naming: 'english' },
    },
    laneWidth,
  );
}

describe('close notes of one section', () => {
  it('when the lane is narrow, then their tokens stand over each other, none covered, in the order of pitch', () => {
    const notes = shown('Vc E2 F2 G2', PHONE);
    const [low, middle, high] = notes.map(({ shownY }) => shownY);
    expect((low ?? 0) - (middle ?? 0)).toBeGreaterThanOrEqual(TOKEN);
    expect((middle ?? 0) - (high ?? 0)).toBeGreaterThanOrEqual(TOKEN);
    expect(new Set(notes.map(({ left }) => left)).size).toBe(1);
  });

  it('when tokens make room, then each still knows the height of its exact pitch', () => {
    const ys = shown('Vc E2 G2', PHONE).map(({ y }) => y);
    expect(ys).toEqual([axis.yOf(midiOfName('E2')), axis.yOf(midiOfName('G2'))]);
  });

  it('when they play the same note, then both tokens are seen', () => {
    const [one, other] = shown('Vc E2 E2', PHONE);
    expect(Math.abs((one?.shownY ?? 0) - (other?.shownY ?? 0))).toBeGreaterThanOrEqual(TOKEN);
  });

  it('when the lane has room, then they stand beside each other at their pitches', () => {
    const notes = shown('Vc E2 G2', DESK);
    expect(notes.map(({ shownY }) => shownY)).toEqual(notes.map(({ y }) => y));
    expect(notes[0]?.left).not.toBe(notes[1]?.left);
  });

  it('when notes stand far apart, then even in a narrow lane they stand at their pitches', () => {
    const notes = shown('Vc C2 C4', PHONE);
    expect(notes.map(({ shownY, tight }) => [shownY, tight])).toEqual(notes.map(({ y }) => [y, false]));
  });
});
