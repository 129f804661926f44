import { mount } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import type { Ensemble } from '#shared/study/study.document';
import { DEFAULT_ENSEMBLE } from '#shared/study/study.document';
import { pitchAxis } from '@/charts/pitch-axis';
import HeldBars from '@/components/compare/HeldBars.vue';
import HeldNotes from '@/components/compare/HeldNotes.vue';
import HeldPartials from '@/components/compare/HeldPartials.vue';
import { analysisOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

const axis = pitchAxis([], 500, 40);
const ensemble: Ensemble = DEFAULT_ENSEMBLE;
const spelling = { tonic: 'C', mode: 'major' } as const;
const heldOf = (line: string) => {
  const chord = chordOf(line);
  return { chord, analysis: analysisOf(chord), ensemble };
};

function notes(before: string, now: string) {
  const chord = chordOf(now);
  return mount(HeldNotes, {
    props: {
      ...{ held: heldOf(before), chord, analysis: analysisOf(chord) },
      ...{ ensemble, spelling, naming: 'english', axis },
    },
  });
}

describe('the held voicing over the lanes', () => {
  it('when nothing differs, then nothing is drawn', () => {
    const wrapper = notes('DB D2, Vc A2', 'DB D2, Vc A2');
    expect(wrapper.findAll('.ghost, .ring, .motion')).toHaveLength(0);
  });

  it('when a voice has moved, then a ghost stays, the note is ringed, and a line goes from one to the other', () => {
    const wrapper = notes('Vc A2', 'Vc A3');
    expect(wrapper.findAll('.ghost').map((ghost) => ghost.text())).toEqual([expect.stringContaining('A2')]);
    expect(wrapper.get('.ghost').classes()).not.toContain('gone');
    expect(wrapper.get('.ring').classes()).toContain('moved');
    expect(Number(wrapper.get('.motion').attributes('y1'))).toBeGreaterThan(
      Number(wrapper.get('.motion').attributes('y2')),
    );
  });

  it('when a note is gone and another new, then one is dashed and the other ringed, with no line', () => {
    const wrapper = notes('DB D2, Vc A2', 'Vn1 E5, DB D2');
    expect(wrapper.get('.ghost.gone').text()).toContain('A2');
    expect(wrapper.get('.ring.new').text()).toContain('E5');
    expect(wrapper.findAll('.motion')).toHaveLength(0);
  });

  it('when a voice moves by a step, then its line stands beside the note', () => {
    const wrapper = notes('Vc A2', 'Vc B2');
    expect(wrapper.get('.motion').classes()).toContain('near');
    expect(wrapper.get('.ghost').classes()).toContain('crowded');
  });
});

describe('the held voicing over the other panes', () => {
  it('when a register differs, then its outline is as long as it was, and the change stands in figures', () => {
    const chord = chordOf('Vc A2');
    const figures = (great: number) => analysisOf(chord, { registers: { great: { index: great, at: 40 } } });
    const held = { chord, analysis: figures(52), ensemble };
    const wrapper = mount(HeldBars, { props: { held, analysis: figures(14), axis } });
    const place = wrapper.findAll('.place').find((found) => found.text() !== '');
    expect(place?.text()).toBe('A 52: −38');
    expect(place?.get('.outline').attributes('style')).toContain('width: 52%');
  });

  it('when a note has moved, then its partials are dashed and the new fundamental is ringed', () => {
    const chord = chordOf('Vc A3');
    const wrapper = mount(HeldPartials, {
      props: { held: heldOf('Vc A2'), analysis: analysisOf(chord), axis, a4Hz: 440 },
    });
    expect(wrapper.findAll('line')).toHaveLength(3);
    expect(wrapper.findAll('.ring')).toHaveLength(1);
  });
});
