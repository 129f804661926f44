import { mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { describe, expect, it } from 'vitest';
import GuessPanel from '@/components/guess/GuessPanel.vue';
import GuessVerdict from '@/components/guess/GuessVerdict.vue';
import { analysisOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

function panel() {
  return mount(GuessPanel, { global: { plugins: [Quasar] } });
}

describe('guessing first', () => {
  it('when only one of two is said, then nothing is uncovered', async () => {
    const wrapper = panel();
    await wrapper.get('input[value="great"]').setValue();
    expect(wrapper.get('button').attributes('disabled')).toBeDefined();
    await wrapper.get('form').trigger('submit');
    expect(wrapper.emitted('guess')).toBeUndefined();
  });

  it('when place and amount are said, then that is the guess', async () => {
    const wrapper = panel();
    await wrapper.get('input[value="small"]').setValue();
    await wrapper.get('input[value="over"]').setValue();
    await wrapper.get('form').trigger('submit');
    expect(wrapper.emitted('guess')).toEqual([[{ register: 'small', level: 'over' }]]);
  });

  it('when it is taken to be clear, then it need not be said that this is under 50', async () => {
    const wrapper = panel();
    await wrapper.get('input[value="clear"]').setValue();
    await wrapper.get('form').trigger('submit');
    expect(wrapper.emitted('guess')).toEqual([[{ register: 'clear', level: 'under' }]]);
  });

  it('when it was guessed, then both answers stand side by side, and it can be guessed again', async () => {
    const analysis = analysisOf(chordOf('Vc C2 E2'), { registers: { great: { index: 72, at: 38 } } });
    const wrapper = mount(GuessVerdict, {
      props: { analysis, guess: { register: 'small', level: 'over' } },
      global: { plugins: [Quasar] },
    });
    expect(wrapper.text()).toContain('You: the small octave, over 50.');
    expect(wrapper.text()).toContain('The model: cloudiest in the great octave, 72');
    expect(wrapper.text()).toContain('It is a model');
    await wrapper.get('button').trigger('click');
    expect(wrapper.emitted('again')).toHaveLength(1);
  });
});
