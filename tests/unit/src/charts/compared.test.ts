import { describe, expect, it } from 'vitest';
import { midiOfFrequency } from '#shared/pitch/tuning';
import { smallProfile } from '@/charts/beside';
import { heldBars } from '@/charts/held-bars';
import { differentPartials } from '@/charts/held-partials';
import { pitchAxis } from '@/charts/pitch-axis';
import { analysisOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

const axis = pitchAxis([], 500, 40);
const chord = chordOf('Vc A2');

describe('the bars of the held voicing', () => {
  const before = analysisOf(chord, {
    registers: { great: { index: 52, at: 40 }, small: { index: 30, at: 50 } },
  });
  const now = analysisOf(chord, {
    registers: { great: { index: 14, at: 40 }, small: { index: 30.4, at: 50 } },
  });
  const bars = heldBars(before, now, axis);
  const of = (name: string) => bars.find(({ register }) => register === name);

  it('when a register differs clearly, then its change is a figure with its sign', () => {
    expect(of('great')).toMatchObject({ held: 52, change: '−38', clear: true, told: true });
  });

  it('when it differs by less than is sure, then that is said', () => {
    expect(of('small')).toMatchObject({ held: 30, change: 'no clear difference', clear: false, told: true });
  });

  it('when neither clouds in a register, then nothing is told of it', () => {
    expect(of('two-line')).toMatchObject({ held: 0, told: false });
  });

  it('when bars are drawn, then each stands in the middle of its octave', () => {
    // C2 to B2 with a quarter tone round them: 35.5 to 47.5.
    expect(of('great')?.y).toBeCloseTo(axis.yOf(41.5), 6);
  });
});

describe('the partials that differ', () => {
  const parts = (held: string, now: string) =>
    differentPartials({
      ...{ held: analysisOf(chordOf(held)), now: analysisOf(chordOf(now)), axis, topDb: 4 },
      midiOf: (hertz) => midiOfFrequency(hertz, 440),
    });

  it('when both sound the same, then none is drawn', () => {
    expect(parts('Vc A2', 'Vc A2')).toEqual({ onlyHeld: [], onlyNow: [] });
  });

  it('when a note has moved, then its partials are only in the held one, and its new fundamental is ringed', () => {
    const { onlyHeld, onlyNow } = parts('Vc A2', 'Vc A3');
    // Of A2, 110 Hz: the fundamental and two octave-and-more partials, at A2, A3 and E4.
    expect(onlyHeld.map(({ fundamental }) => fundamental)).toEqual([true, false, false]);
    expect(onlyHeld.map(({ y }) => y)[0]).toBeCloseTo(axis.yOf(45), 6);
    expect(onlyHeld.map(({ y }) => y)[1]).toBeCloseTo(axis.yOf(57), 6);
    expect(onlyNow).toHaveLength(1);
    expect(onlyNow[0]?.y).toBeCloseTo(axis.yOf(57), 6);
  });

  it('when levels are placed, then the loudest stands at 0 dB of a scale from −60 to 4', () => {
    const { onlyHeld } = parts('Vc A2', 'Vc A3');
    expect(onlyHeld.map(({ x }) => x)).toEqual([(100 * 60) / 64, (100 * 54) / 64, (100 * 48) / 64]);
  });
});

describe('small profiles on one axis', () => {
  it('when a register clouds, then its bar lies over its own octave, as long as its figure', () => {
    const analysis = analysisOf(chord, { registers: { great: { index: 50, at: 40 } } });
    const { bars, notes } = smallProfile(analysis, axis, { bars: 80, lanes: 50 });
    const great = bars.find(({ register }) => register === 'great');
    expect(great).toMatchObject({ width: 40 });
    expect(great?.y).toBeCloseTo(axis.yOf(47.5), 6);
    // The cellos are the fourth of the five lanes.
    expect(notes).toEqual([{ id: 'note-1', section: 'cello', x: 80 + 35, y: axis.yOf(45) }]);
  });
});
