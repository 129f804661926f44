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

  it('when words stand up to the edge of the heads, then no leader has a part left of it', () => {
    const widest = Math.max(...heads.map(({ right }) => right));
    for (const { path } of leadersOf(heads, voices, axis, END)) {
      const numbers = path.match(/-?[\d.]+/g)?.map(Number) ?? [];
      const xs = numbers.filter((_, index) => index % 2 === 0);
      expect(xs).toHaveLength(4);
      for (const x of xs) {
        expect(x).toBeGreaterThan(widest);
        expect(x).toBeLessThanOrEqual(END);
      }
    }
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
