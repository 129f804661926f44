import { flushPromises, mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Annotation } from '#shared/contracts/annotations';
import TalkPanel from '@/components/talk/TalkPanel.vue';

const remark = (id: string, mine: boolean, chordId: string | null): Annotation => ({
  id,
  mine,
  anchor: chordId === null ? { kind: 'study' } : { kind: 'chord', chordId },
  text: `said ${id}`,
  authorName: 'Bea Marsh',
  writtenAt: '2026-03-01T10:00:00.000Z',
});

type Props = InstanceType<typeof TalkPanel>['$props'];

function panelOf(props: Partial<Props> = {}) {
  const write = vi.fn<Props['write']>(() => Promise.resolve());
  const wrapper = mount(TalkPanel, {
    props: {
      ...{
        chordId: 'chord-a',
        chordName: 'chord 1',
        mayWrite: true,
        mayModerate: false,
        trouble: null,
        write,
      },
      ...{ now: new Date('2026-03-01T10:12:00Z'), timeZone: 'UTC' },
      annotations: [
        remark('one', false, 'chord-a'),
        remark('two', true, null),
        remark('three', false, 'chord-b'),
      ],
      ...props,
    },
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
  const removals = () => wrapper.findAll('li button').map((button) => button.attributes('aria-label'));
  return { wrapper, write, removals };
}

afterEach(() => {
  document.body.innerHTML = '';
});

describe('the talk', () => {
  it('when a chord is in view, then what was said of it and of the study is there, of other chords not', () => {
    const { wrapper } = panelOf();
    expect(wrapper.text()).toContain('said one');
    expect(wrapper.text()).toContain('said two');
    expect(wrapper.text()).not.toContain('said three');
  });

  it('when the reader may write, then they may take away their own remarks and no others', () => {
    expect(panelOf().removals()).toEqual([expect.stringContaining('remark by You')]);
  });

  it('when the study is the reader’s, then they may take away every remark', () => {
    expect(panelOf({ mayModerate: true }).removals()).toHaveLength(2);
  });

  it('when the reader may only look, then there is nowhere to write and it says so', () => {
    const { wrapper } = panelOf({ mayWrite: false });
    expect(wrapper.find('textarea').exists()).toBe(false);
    expect(wrapper.text()).toContain('shared with you to look and listen');
  });

  it('when something is written, then it goes to the thing that it is about, and the field is empty again', async () => {
    const { wrapper, write } = panelOf();
    const [onChord, onStudy] = wrapper.findAll('form');
    await onChord?.get('textarea').setValue('  why the third? ');
    await onChord?.trigger('submit');
    await onStudy?.get('textarea').setValue('finer');
    await onStudy?.trigger('submit');
    await flushPromises();
    expect(write.mock.calls).toEqual([
      ['why the third?', 'chord-a'],
      ['finer', null],
    ]);
    expect(onChord?.get('textarea').element).toHaveProperty('value', '');
  });

  it('when somebody wrote markup, then it is read as it stands', () => {
    const text = '<img src=x onerror=alert(1)>';
    const { wrapper } = panelOf({ annotations: [{ ...remark('one', false, null), text }] });
    expect(wrapper.text()).toContain(text);
    expect(wrapper.find('img').exists()).toBe(false);
  });
});
