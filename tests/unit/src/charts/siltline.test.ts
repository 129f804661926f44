import { describe, expect, it } from 'vitest';
import { roomText } from '#shared/voicing/siltline.sentences';
import { pitchAxis } from '@/charts/pitch-axis';
import { roomSteps, siltlineField, stratumOf } from '@/charts/siltline';

// Made up: above note 40 a second clouds, a third is an island, a fourth clouds, and from a fifth on it is clear.
const map = {
  lowest: 40,
  highest: 41,
  widest: 4,
  index: [
    [90, 30, 60, 10],
    [10, 10, 10, 10],
  ],
};
const axis = pitchAxis([], 500, 40);
const pair = { lower: { section: 'cello' }, upper: { section: 'viola' } } as Parameters<typeof roomText>[1];

describe('the siltline', () => {
  it('when an index lies in a stratum, then that is known by its lower end', () => {
    expect([0, 25, 26, 50, 51, 75, 76, 100].map(stratumOf)).toEqual([0, 0, 25, 25, 50, 50, 75, 75]);
  });

  it('when there is a clear island in the sediment, then it is drawn as one, with the line round it', () => {
    const { strata, line } = siltlineField(map, axis, 40);
    expect(strata.map(({ x, width, fill }) => [x, width, fill])).toEqual([
      [0, 10, 'var(--silt-75)'],
      [10, 10, 'var(--silt-25)'],
      [20, 10, 'var(--silt-50)'],
    ]);
    expect(line.match(/V/g)).toHaveLength(3);
    expect(line.match(/H/g)).toHaveLength(2);
  });

  it('when a note is selected, then each height above it says whether a note there would cloud', () => {
    const steps = roomSteps(map, 40, axis);
    expect(steps.map(({ semitones, clouds }) => [semitones, clouds])).toEqual([
      [1, true],
      [2, false],
      [3, true],
      [4, false],
    ]);
    expect(roomSteps(map, 60, axis)).toEqual([]);
  });

  it('when it is read out, then the room is named, and what is clear nearer', () => {
    const key = { tonic: 'C', mode: 'major' } as const;
    expect(roomText(map, pair, 40, key, 'english')).toBe(
      'Room above E2, cellos with violas above: clear from 4 semitones up, at A♭2; nearer, clear at 2 semitones.',
    );
    expect(roomText(map, pair, 41, key, 'english')).toContain('clear at every interval');
    expect(roomText(map, pair, 60, key, 'english')).toBeNull();
  });
});
