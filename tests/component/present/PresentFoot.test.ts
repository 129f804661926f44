import { mount } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import FigureDrawing from '@/components/present/FigureDrawing.vue';
import PresentFoot from '@/components/present/PresentFoot.vue';
import { svgNode } from '@/export/svg/nodes';
import { analysisOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

const analysis = analysisOf(chordOf('Vc C2 E2'), {
  registers: { great: { index: 72, at: 38 } },
  limits: [{ lowerId: 'note-1', upperId: 'note-2', interval: 'M3', limit: 'Bb2', semitonesBelow: 10 }],
});

describe('the foot of the projector', () => {
  it('when figures are covered, then the page holds a question and no answer', () => {
    const wrapper = mount(PresentFoot, { props: { analysis, naming: 'english', covered: true } });
    expect(wrapper.html()).not.toMatch(/72|great|semitones/);
    expect(wrapper.text()).toContain('In which register does it cloud?');
  });

  it('when they are uncovered, then figure, band and sentence are told', () => {
    const wrapper = mount(PresentFoot, { props: { analysis, naming: 'english', covered: false } });
    expect(wrapper.get('.figure').text()).toBe('72');
    expect(wrapper.text()).toContain('give or take 5: cloudiest in the great octave');
    expect(wrapper.text()).toContain('C2–E2, a major third, stands 10 semitones under its low limit');
  });
});

describe('a figure on the page', () => {
  it('when words come from people, then they are text and nothing else', () => {
    const figure = svgNode('svg', { viewBox: '0 0 1 1' }, [svgNode('text', {}, ['<img src=x onerror=y>'])]);
    const wrapper = mount(FigureDrawing, { props: { figure, label: 'A "chord"' } });
    expect(wrapper.find('img').exists()).toBe(false);
    expect(wrapper.get('text').text()).toBe('<img src=x onerror=y>');
    expect(wrapper.get('svg').attributes('aria-label')).toBe('A "chord"');
  });
});
