import { describe, expect, it } from 'vitest';
import { midiOfFrequency } from '#shared/pitch/tuning';
import { cloudingRows, meetingBrackets } from '@/charts/clouding';
import { overtonesData, overtonesOptions, type ChartColours } from '@/charts/overtones';
import { pitchAxis } from '@/charts/pitch-axis';
import { registerBars } from '@/charts/register-bars';
import { spacingOf } from '@/charts/spacing';
import { analysisOf, soundsOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

const axis = pitchAxis([], 500, 40);
const midiOf = (hertz: number) => midiOfFrequency(hertz, 440);
const colours: ChartColours = {
  sections: {
    violin1: '#111111',
    violin2: '#222222',
    viola: '#333333',
    cello: '#444444',
    doubleBass: '#555555',
  },
  ...{ ink: '#000000', quiet: '#777777', line: '#cccccc', surface: '#ffffff' },
};
const overtones = (line: string) => ({
  ...{ voices: soundsOf(chordOf(line)), axis, midiOf, colours },
  ...{ naming: 'english' as const, emphasised: [] },
});

describe('the overtones plot', () => {
  it('when two notes sound, then every partial is a tick at its pitch, the longest first', () => {
    const [marks, lines] = overtonesData(overtones('Vc A2, Va E4')).datasets;
    const ends = (lines?.data ?? []).filter(({ tick }) => tick !== null);
    expect(marks?.data.map(({ tick }) => tick?.n)).toEqual([1, 1]);
    // A2 with 220 and 330 Hz, E4 with 659 and 989 Hz above: levels 0, −6, −12 of each.
    expect(ends.map(({ x }) => x)).toEqual([0, 0, -6, -6, -12, -12]);
    const heights = [110, 220, 330].map((hertz) => axis.yOf(midiOf(hertz)));
    for (const y of heights) {
      expect(Math.min(...ends.map((end) => Math.abs((end.y ?? NaN) - y)))).toBeLessThan(1e-6);
    }
  });

  it('when a partial is far under the loudest, then it is not drawn', () => {
    const input = overtones('Vc A2');
    const voices = input.voices.map((voice) => ({
      ...voice,
      partials: voice.partials.map((partial) => ({ ...partial, levelDb: partial.n === 3 ? -70 : 0 })),
    }));
    expect(overtonesData({ ...input, voices }).datasets[1]?.data.filter(({ tick }) => tick)).toHaveLength(2);
  });

  it('when the axis is drawn, then the chart’s heights are the bench’s own pixels', () => {
    const { scales, layout } = overtonesOptions({ height: axis.height, colours, naming: 'english' });
    expect(scales?.['y']).toMatchObject({ display: false, reverse: true, min: 0, max: 500 });
    expect(layout).toMatchObject({ padding: 0, autoPadding: false });
  });
});

describe('clouding on the plot', () => {
  it('when registers cloud, then each has a row at its cloudiest place, and clear ones have none', () => {
    const analysis = analysisOf(chordOf('Vc A2'), {
      registers: { great: { index: 70, at: 40 }, small: { index: 5, at: 50 } },
    });
    const rows = cloudingRows(analysis, axis);
    expect(rows.map(({ register }) => register)).toEqual(['great']);
    expect((rows[0]?.top ?? 0) + (rows[0]?.height ?? 0) / 2).toBeCloseTo(axis.yOf(40), 9);
  });

  it('when partials meet, then the bracket says how far apart they stand', () => {
    const analysis = analysisOf(chordOf('DB D2, Vc A2'), {
      pairs: [
        {
          ...{ lowerId: 'note-1', upperId: 'note-2', register: 'great', share: 1 },
          meetings: [{ lowerN: 1, upperN: 1, differenceHz: 36.6, share: 1 }],
        },
      ],
    });
    expect(meetingBrackets(analysis, axis, midiOf).map(({ label }) => label)).toEqual(['37 Hz']);
  });
});

describe('the muddiness bars', () => {
  it('when a register clouds most, then its bar is the chord’s own figure', () => {
    const analysis = analysisOf(chordOf('Vc A2'), {
      registers: { great: { index: 51.6, at: 40 }, small: { index: 30.2, at: 50 } },
    });
    const bars = registerBars(analysis, axis);
    expect(bars.map(({ register, index }) => `${register} ${index}`)).toEqual([
      'contra 0',
      'great 52',
      'small 30',
      'one-line 0',
      'two-line 0',
      'three-line and up 0',
    ]);
    expect(bars.filter(({ cloudiest }) => cloudiest).map(({ register }) => register)).toEqual(['great']);
  });

  it('when bars are placed, then low ones stand low', () => {
    const ys = registerBars(analysisOf(chordOf('Vc A2')), axis).map(({ y }) => y);
    expect(ys).toEqual([...ys].sort((a, b) => b - a));
  });

  it('when the lowest register only just shows, then its bar ends at the foot and none covers another’s name', () => {
    const analysis = analysisOf(chordOf('DB B0'), {
      registers: { subcontra: { index: 80, at: 23 }, contra: { index: 85, at: 26 } },
    });
    const [bar, name] = [20, 15];
    const bars = registerBars(analysis, pitchAxis([23], 320, 40), { bar, name });
    const ys = bars.map(({ y }) => y);
    expect(bars[0]?.register).toBe('subcontra');
    expect(ys[0]).toBe(320 - bar / 2);
    ys.slice(1).forEach((y, index) => expect((ys[index] ?? 0) - y).toBeGreaterThanOrEqual(bar + name));
  });
});

describe('the spacing brackets', () => {
  const words = { naming: 'english', brief: false } as const;

  it('when notes sound, then neighbours are bracketed', () => {
    const brackets = spacingOf(analysisOf(chordOf('DB D2, Vc A2, Va F3')), axis, words);
    expect(brackets.map(({ label, column, under }) => [label, column, under])).toEqual([
      ['5th', 0, 0],
      ['min 6th', 0, 0],
    ]);
  });

  it('when any other pair stands under its limit, then it stands beside them with its size', () => {
    const analysis = analysisOf(chordOf('DB Db2 F2, Vc Bb2'), {
      limits: [{ lowerId: 'note-1', upperId: 'note-3', interval: 'M6', limit: 'F2', semitonesBelow: 4 }],
    });
    const brackets = spacingOf(analysis, axis, words);
    const wide = brackets.find(({ under }) => under === 4);
    expect(wide?.label).toBe('maj 6th, 4 under');
    expect(wide?.column).toBe(1);
    expect(wide?.spoken).toBe('D♭2 to B♭2: major sixth, 4 semitones under its low limit');
    expect(spacingOf(analysis, axis, { ...words, brief: true }).map(({ label }) => label)).toContain(
      '4 under',
    );
  });

  it('when two voices are in unison, then there is nothing to bracket between them', () => {
    expect(spacingOf(analysisOf(chordOf('Vc A2, Va A2')), axis, words)).toEqual([]);
  });

  it('when there are more pairs than room for words, then those under their limit keep theirs', () => {
    const line = Array.from(
      { length: 40 },
      (_, index) => ['C', 'D', 'E', 'F', 'G', 'A', 'B'][index % 7] + String(1 + Math.floor(index / 7)),
    ).join(' ');
    const chord = chordOf(`Vc ${line}`);
    const analysis = analysisOf(chord, {
      limits: [{ lowerId: 'note-1', upperId: 'note-2', interval: 'M2', limit: 'C4', semitonesBelow: 30 }],
    });
    const brackets = spacingOf(analysis, axis, words);
    expect(brackets.some(({ labelY }) => labelY === null)).toBe(true);
    expect(brackets.find(({ under }) => under === 30)?.labelY).not.toBeNull();
  });
});
