import { mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { describe, expect, it } from 'vitest';
import type { Finding } from '#shared/voicing/sentences';
import Findings from '@/components/findings/Findings.vue';
import Headline from '@/components/findings/Headline.vue';
import { analysisOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

const finding = (number: number): Finding => ({
  ...{ lowerId: `low-${number}`, upperId: `high-${number}` },
  ...{ share: 0.1, semitonesBelow: 2, text: `Finding ${number}.` },
});

function mountFindings(count: number, props: Partial<InstanceType<typeof Findings>['$props']> = {}) {
  const findings = Array.from({ length: count }, (_, index) => finding(index + 1));
  return mount(Findings, {
    props: {
      findings,
      shown: null,
      heard: null,
      limitOf: () => null,
      register: null,
      registerHeard: false,
      empty: false,
      ...props,
    },
    global: { plugins: [Quasar] },
  });
}

describe('the findings', () => {
  it('when there are more than four, then the rest come when asked for', async () => {
    const wrapper = mountFindings(6);
    expect(wrapper.findAll('li')).toHaveLength(4);
    const more = wrapper.findAll('button').find((button) => button.text() === '2 more');
    await more?.trigger('click');
    expect(wrapper.findAll('li')).toHaveLength(6);
  });

  it('when one is heard or shown, then its two notes are asked for', async () => {
    const wrapper = mountFindings(1);
    const [hear, show] = wrapper.findAll('li button');
    await hear?.trigger('click');
    await show?.trigger('click');
    expect(wrapper.emitted('hear')).toEqual([[finding(1)]]);
    expect(wrapper.emitted('show')).toEqual([[finding(1)]]);
  });

  it('when the one that is shown is asked for again, then nothing is pointed out', async () => {
    const wrapper = mountFindings(1, { shown: { lowerId: 'low-1', upperId: 'high-1' } });
    const show = wrapper.findAll('li button')[1];
    expect(show?.attributes('aria-pressed')).toBe('true');
    await show?.trigger('click');
    expect(wrapper.emitted('show')).toEqual([[null]]);
  });

  it('when there are none, then that is said', () => {
    expect(mountFindings(0).text()).toContain('Nothing clouds here');
    expect(mountFindings(0, { empty: true }).text()).toContain('as soon as two notes sound');
  });
});

describe('the headline', () => {
  it('when a chord is judged, then its figure, its register and the caution stand together', () => {
    const analysis = analysisOf(chordOf('Vc A2'), { registers: { great: { index: 57.6, at: 40 } } });
    const text = mount(Headline, { props: { analysis } }).text();
    expect(text).toContain('58');
    expect(text).toContain('give or take 5');
    expect(text).toContain('cloudiest in the great octave');
    expect(text).toContain('The index is a model');
  });
});
