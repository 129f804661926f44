import { mount } from '@vue/test-utils';
import { ClosePopup, Quasar } from 'quasar';
import { describe, expect, it } from 'vitest';
import EditPanel from '@/components/bench/EditPanel.vue';

function panel() {
  const wrapper = mount(EditPanel, {
    props: { selected: 1, studyKey: { tonic: 'C', mode: 'major' }, naming: 'english' },
    global: { plugins: [[Quasar, { directives: { ClosePopup } }]] },
  });
  const field = wrapper.get<HTMLInputElement>('input[type="number"]');
  return { wrapper, field, form: wrapper.get('form') };
}

describe('transposing by a typed number', () => {
  it.each(['99', '-37', '1.5', ''])(
    'when %j is typed, then the field says what it takes, and nothing moves',
    async (typed) => {
      const { wrapper, field, form } = panel();
      await field.setValue(typed);
      await form.trigger('submit');
      expect(wrapper.get('[role="status"]').text()).toBe('Whole semitones, from −36 to 36');
      expect(field.attributes('aria-invalid')).toBe('true');
      expect(wrapper.emitted('transpose')).toBeUndefined();
    },
  );

  it('when the form is sent, then it is this page and not the browser that says what is amiss', () => {
    expect(panel().form.attributes('novalidate')).toBeDefined();
  });

  it.each([-36, 7, 36])('when %i is typed, then the chord moves by that', async (semitones) => {
    const { wrapper, field, form } = panel();
    await field.setValue(String(semitones));
    await form.trigger('submit');
    expect(wrapper.get('[role="status"]').text()).toBe('');
    expect(wrapper.emitted('transpose')).toEqual([[{ what: 'chord', by: 'semitones', semitones }]]);
  });
});
