import { describe, expect, it } from 'vitest';
import { midiOfName } from '#shared/pitch/names';
import { pitchAxis } from '@/charts/pitch-axis';
import { leadersOf } from '@/engraving/leaders';
import { newVoice } from '#shared/study/new-study';

const axis = pitchAxis([], 500, 40);
const END = 190;

describe('the leaders', () => {
  const voices = [newVoice('voice-low', 'cello', 'A2'), newVoice('voice-top', 'violin1', 'E6')];
  const heads = [
    { voiceId: 'voice-low', left: 130, right: 140, y: 300 },
    // Stopped and touched: an artificial harmonic has two heads.
    { voiceId: 'voice-top', left: 130, right: 140, y: 60 },
    { voiceId: 'voice-top', left: 142, right: 152, y: 50 },
  ];

  it('when heads are drawn, then each voice has one, which ends at its height on the axis', () => {
    const leaders = leadersOf(heads, voices, axis, END);
    expect(leaders.map(({ voiceId, to }) => [voiceId, to.x, to.y])).toEqual([
      ['voice-low', END, axis.yOf(midiOfName('A2'))],
      ['voice-top', END, axis.yOf(midiOfName('E6'))],
    ]);
    expect(leaders.map(({ from }) => from.y)).toEqual([300, 50]);
  });

  it('when words stand up to the edge of the heads, then leaders turn up or down only right of them all', () => {
    const widest = Math.max(...heads.map(({ right }) => right));
    for (const { from, path } of leadersOf(heads, voices, axis, END)) {
      const numbers = path.match(/-?[\d.]+/g)?.map(Number) ?? [];
      const points = numbers.flatMap((x, index) => (index % 2 === 0 ? [{ x, y: numbers[index + 1] }] : []));
      expect(points).toHaveLength(5);
      for (const { x, y } of points) {
        if (y !== from.y) expect(x).toBeGreaterThan(widest);
        expect(x).toBeGreaterThanOrEqual(from.x);
        expect(x).toBeLessThanOrEqual(END);
      }
    }
  });

  it('when a head of another section is set aside, then a leader begins beside its own staff’s heads', () => {
    const [low] = leadersOf(heads, voices, axis, END);
    expect(low?.from.x).toBeGreaterThan(140);
    expect(low?.from.x).toBeLessThan(152);
  });

  it('when the axis is another, then the leaders end at its heights', () => {
    const higher = pitchAxis([100], 300, 20);
    const [first] = leadersOf(heads, voices, higher, END);
    expect(first?.to.y).toBe(higher.yOf(midiOfName('A2')));
  });

  it('when a voice has no head yet, then it has no leader', () => {
    expect(leadersOf([], voices, axis, END)).toEqual([]);
  });
});
