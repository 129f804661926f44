import { mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, describe, expect, it } from 'vitest';
import { EXAMPLE_CHORDS } from '#shared/study/examples';
import { comfortableReach } from '#shared/study/reach';
import { parseTypingLine } from '#shared/study/typing-line';
import EmptyBench from '@/components/bench/EmptyBench.vue';

function mountEmpty(trouble: string | null = null) {
  const wrapper = mount(EmptyBench, {
    props: { trouble, tour: 'Tour' },
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
  const press = (label: string) =>
    wrapper
      .findAll('button')
      .find((button) => button.text() === label)
      ?.trigger('click');
  return { wrapper, press };
}

afterEach(() => {
  document.body.innerHTML = '';
});

describe('the empty bench', () => {
  it('when it is shown, then it offers three ways and the tour', () => {
    const { wrapper } = mountEmpty();
    expect(wrapper.findAll('li')).toHaveLength(3);
    expect(wrapper.text()).toMatch(/Write the notes.*Take an example.*Deal a chord.*Tour/s);
  });

  it('when an example is taken, then its line is given on, and it can be read without a fault', async () => {
    const { wrapper, press } = mountEmpty();
    for (const { title } of EXAMPLE_CHORDS) await press(title);
    const lines = wrapper.emitted<[string]>('example')?.map(([line]) => line) ?? [];
    expect(lines).toEqual(EXAMPLE_CHORDS.map(({ line }) => line));
    for (const line of lines) {
      expect(parseTypingLine(line, 'english', comfortableReach('four-string')).faults).toEqual([]);
    }
  });

  it('when a symbol is dealt, then it is given on, and what cannot be read is told beside it', async () => {
    const { wrapper, press } = mountEmpty('“Hx7” is no chord');
    expect(wrapper.get('[role="alert"]').text()).toBe('');
    await wrapper.get('input').setValue('Hx7');
    await wrapper.get('form').trigger('submit');
    expect(wrapper.emitted('deal')).toEqual([['Hx7']]);
    expect(wrapper.get('[role="alert"]').text()).toContain('“Hx7” is no chord');
    expect(wrapper.get('input').attributes('aria-invalid')).toBe('true');
    await press('To the notes line');
    expect(wrapper.emitted('write')).toHaveLength(1);
  });

  it('when nothing is written to deal, then the button waits', () => {
    const { wrapper } = mountEmpty();
    expect(wrapper.get('button[type="submit"]').attributes('disabled')).toBeDefined();
  });
});
