import { describe, expect, it } from 'vitest';
import { stretchesOf, type SaveMark } from '#shared/study/stretches';

const MINUTE_MS = 60_000;
const save = (minute: number, mark: Partial<SaveMark> = {}): SaveMark => ({
  savedAt: new Date(minute * MINUTE_MS),
  savedBy: 'ada',
  deviceKey: 'here',
  name: null,
  ...mark,
});
const sizes = (...saves: SaveMark[]) => stretchesOf(saves).map(({ length }) => length);

describe('stretches of editing', () => {
  it('when pauses are under ten minutes, then it is one; with ten, two', () => {
    expect(sizes(save(19), save(10), save(1))).toEqual([3]);
    expect(sizes(save(20), save(10))).toEqual([1, 1]);
  });

  it('when another person or another machine saves in between, then each stretch stands by itself', () => {
    expect(sizes(save(3), save(2, { savedBy: 'ben' }), save(1))).toEqual([1, 1, 1]);
    expect(sizes(save(3), save(2, { deviceKey: 'there' }), save(1))).toEqual([1, 1, 1]);
  });

  it('when a save has a name, then it ends its stretch', () => {
    expect(sizes(save(4), save(3, { name: 'First' }), save(2), save(1))).toEqual([1, 3]);
  });

  it('when there are no saves, then there is no stretch', () => {
    expect(stretchesOf([])).toEqual([]);
  });
});
