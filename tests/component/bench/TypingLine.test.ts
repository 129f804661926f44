import { mount } from '@vue/test-utils';
import { afterEach, describe, expect, it } from 'vitest';
import { DEFAULT_DEAL } from '#shared/study/harmony/deal-choice';
import { comfortableReach } from '#shared/study/reach';
import type { TypedVoice } from '#shared/study/typing-line';
import TypingLine from '@/components/bench/TypingLine.vue';
import { chordOf } from '../../support/typed-chords';

const reach = comfortableReach('four-string');
const C_MAJOR = { tonic: 'C', mode: 'major' } as const;

function lineOf(typed: string, props: Partial<InstanceType<typeof TypingLine>['$props']> = {}) {
  const wrapper = mount(TypingLine, {
    props: {
      chord: chordOf(typed),
      naming: 'english',
      reach,
      readOnly: false,
      spelling: C_MAJOR,
      deal: DEFAULT_DEAL,
      ...props,
    },
    attachTo: document.body,
  });
  const field = wrapper.get('input');
  const type = async (text: string) => {
    field.element.value = text;
    field.element.setSelectionRange(text.length, text.length);
    await field.trigger('input');
  };
  const lastTyped = () => {
    const [voices] = wrapper.emitted<[readonly TypedVoice[]]>('typed')?.at(-1) ?? [];
    return voices?.map(({ section, pitch }) => `${section} ${pitch}`);
  };
  return { wrapper, field, type, lastTyped };
}

afterEach(() => {
  document.body.innerHTML = '';
});

describe('the typing line', () => {
  it('when nobody types, then it shows the chord', () => {
    expect(lineOf('DB D2, Vc Bb2+F3').field.element.value).toBe('DB D2, Vc B♭2+F3');
  });

  it('when what is typed can be read, then it is given on at once', async () => {
    const { wrapper, type, lastTyped } = lineOf('');
    await type('Vc A2 F3');
    expect(wrapper.emitted('begin')).toHaveLength(1);
    expect(lastTyped()).toEqual(['cello A2', 'cello F3']);
    expect(wrapper.emitted('end')).toBeUndefined();
  });

  it('when Enter is pressed, then the line is taken and shows the chord again', async () => {
    const { wrapper, field, type } = lineOf('');
    await type('Vc A2');
    await field.trigger('keydown', { key: 'Enter' });
    expect(wrapper.emitted('end')).toHaveLength(1);
    await wrapper.setProps({ chord: chordOf('Vc A2') });
    expect(field.element.value).toBe('Vc A2');
  });

  it('when the last word may still become a note, then nothing is told yet', async () => {
    const { wrapper, type } = lineOf('');
    await type('Vc A');
    expect(wrapper.findAll('li')).toHaveLength(0);
    expect(wrapper.emitted('typed')).toBeUndefined();
  });

  it('when Enter follows what cannot be read, then every place is told, the text stays and the chord too', async () => {
    const { wrapper, field, type } = lineOf('Vc A2');
    await type('Vc X3 F9');
    await field.trigger('keydown', { key: 'Enter' });
    expect(wrapper.findAll('li').map((item) => item.text())).toEqual([
      expect.stringContaining('“X3”'),
      expect.stringContaining('“F9”'),
    ]);
    expect(wrapper.findAll('mark').map((mark) => mark.text())).toEqual(['X3', 'F9']);
    expect(field.attributes('aria-invalid')).toBe('true');
    expect(field.element.value).toBe('Vc X3 F9');
    expect(wrapper.emitted('cancel')).toHaveLength(1);
    expect(wrapper.emitted('end')).toBeUndefined();
  });

  it('when a fault is chosen, then its place in the text is selected', async () => {
    const { wrapper, field, type } = lineOf('');
    await type('Vc X3 A2');
    await wrapper.get('li button').trigger('click');
    expect([field.element.selectionStart, field.element.selectionEnd]).toEqual([3, 5]);
  });

  it('when Escape is pressed, then the line shows the chord as it was', async () => {
    const { wrapper, field, type } = lineOf('Vc A2');
    await type('Vc A2 X');
    await field.trigger('keydown', { key: 'Escape' });
    expect(wrapper.emitted('cancel')).toHaveLength(1);
    expect(field.element.value).toBe('Vc A2');
    expect(wrapper.emitted('leave')).toBeUndefined();
  });

  it('when Escape is pressed in a line as it is, then it is left', async () => {
    const { wrapper, field } = lineOf('Vc A2');
    await field.trigger('keydown', { key: 'Escape' });
    expect(wrapper.emitted('leave')).toHaveLength(1);
    expect(wrapper.emitted('cancel')).toBeUndefined();
  });

  it('when everything is deleted and Enter pressed, then the chord is emptied', async () => {
    const { field, type, lastTyped } = lineOf('Vc A2');
    await type('');
    expect(lastTyped()).toBeUndefined();
    await field.trigger('keydown', { key: 'Enter' });
    expect(lastTyped()).toEqual([]);
  });

  it('when a chord symbol is typed, then it is told how it is understood, and dealt with Enter', async () => {
    const { wrapper, field, type, lastTyped } = lineOf('');
    await type('Dm');
    expect(lastTyped()).toBeUndefined();
    expect(wrapper.text()).toContain('Dm: D F A, in open position.');
    await field.trigger('keydown', { key: 'Enter' });
    expect(lastTyped()?.[0]).toBe('doubleBass D2');
    expect(lastTyped()).toHaveLength(5);
    expect(wrapper.emitted('end')).toHaveLength(1);
  });

  it('when a numeral is typed, then it is read in the key', async () => {
    const { field, type, lastTyped } = lineOf('', { spelling: { tonic: 'F', mode: 'major' } });
    await type('V7/V close');
    await field.trigger('keydown', { key: 'Enter' });
    expect(lastTyped()?.[0]).toBe('doubleBass G2');
  });

  it('when the melody is locked, then a chord is dealt round it', async () => {
    const { field, type, lastTyped } = lineOf('Vn1 E5[locked]');
    await type('Am');
    await field.trigger('keydown', { key: 'Enter' });
    expect(lastTyped()).toContain('violin1 E5');
  });

  it('when how a note is played is set, then the line says it', () => {
    expect(lineOf('Vc A2[solo pp III]').field.element.value).toBe('Vc A2[solo pp III]');
  });

  it('when the study may only be read, then the line may too', () => {
    expect(lineOf('Vc A2', { readOnly: true }).field.attributes('readonly')).toBeDefined();
  });
});
