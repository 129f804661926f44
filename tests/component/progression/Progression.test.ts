import { mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, describe, expect, it } from 'vitest';
import Progression from '@/components/progression/Progression.vue';
import { analysisOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

const first = { ...chordOf('Vc A2'), id: 'first-chord', name: 'Dm' };
const second = { ...chordOf('Vc C3'), id: 'second-chord', beats: 2 };

function mountProgression(props: Partial<InstanceType<typeof Progression>['$props']> = {}) {
  const analyses = new Map([[first.id, analysisOf(first, { registers: { great: { index: 64, at: 40 } } })]]);
  return mount(Progression, {
    props: {
      ...{ chords: [first, second], analyses, currentId: first.id, soundingId: null },
      ...{ remarks: new Map([[second.id, 2]]), readOnly: false },
      ...props,
    },
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
}

afterEach(() => {
  document.body.innerHTML = '';
});

describe('the progression', () => {
  it('when chords are shown, then each has its name or place, its beats, its figure and its remarks', () => {
    const cards = mountProgression().findAll('[data-chord]');
    expect(cards[0]?.text()).toMatch(/Dm.*4 beats.*64/s);
    expect(cards[1]?.text()).toMatch(/Chord 2.*2 beats.*2 remarks/s);
    expect(cards.map((card) => card.attributes('aria-current'))).toEqual(['true', 'false']);
  });

  it('when a chord is clicked or reached by an arrow, then it is chosen', async () => {
    const wrapper = mountProgression();
    await wrapper.findAll('[data-chord]')[1]?.trigger('click');
    await wrapper.get('ol').trigger('keydown', { key: 'ArrowRight' });
    expect(wrapper.emitted('select')).toEqual([['second-chord'], ['second-chord']]);
  });

  it('when an arrow is pressed with Alt, then the chord is moved', async () => {
    const wrapper = mountProgression();
    await wrapper.get('ol').trigger('keydown', { key: 'ArrowRight', altKey: true });
    expect(wrapper.emitted('place')).toEqual([[1]]);
    expect(wrapper.emitted('select')).toBeUndefined();
  });

  it('when a chord is added, then that is asked for; where one may only read, it cannot be', async () => {
    const wrapper = mountProgression();
    await wrapper.get('[aria-label="Add a chord like this one"]').trigger('click');
    expect(wrapper.emitted('add')).toHaveLength(1);
    expect(mountProgression({ readOnly: true }).find('[aria-label^="Add a chord"]').exists()).toBe(false);
  });
});
