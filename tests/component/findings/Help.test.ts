import { mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { describe, expect, it } from 'vitest';
import type { WeighedMove } from '#shared/voicing/moves/weighed-moves';
import Help from '@/components/findings/Help.vue';
import OnPurpose from '@/components/findings/OnPurpose.vue';
import { keyOfMove } from '@/components/findings/help-text';
import { soundsOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

const EMPTY_PURPOSE = { chord: false, registers: [] };
const chord = chordOf('DB C2, Vc E2, Va G3');
const [bass = '', cello = '', viola = ''] = chord.voices.map(({ id }) => id);

const moveOf = (id: string, after: number): WeighedMove => ({
  ...{ kind: 'leaveOut', ids: [id], pitches: [], section: 'cello' },
  ...{ before: 90, after, uncertainty: 4, lost: null },
  register: { register: 'great', before: 90, after },
});
const moves = [
  moveOf(cello, 20),
  moveOf(bass, 30),
  moveOf(viola, 40),
  { ...moveOf(bass, 50), ids: [bass, viola] },
];

function mountHelp(props: Partial<InstanceType<typeof Help>['$props']> = {}) {
  const base = { state: 'ready', moves, sounds: soundsOf(chord), naming: 'english', purpose: null } as const;
  const rest = { locked: false, asked: false, heard: null, shown: null, mayTry: true };
  return mount(Help, { props: { ...base, ...rest, ...props }, global: { plugins: [Quasar] } });
}

const buttons = (wrapper: ReturnType<typeof mountHelp>, label: string) =>
  wrapper.findAll('button').filter((button) => button.text() === label);

describe('what would help', () => {
  it('when there are moves, then the first three stand there and the rest come when asked for', async () => {
    const wrapper = mountHelp();
    expect(wrapper.findAll('li')).toHaveLength(3);
    expect(wrapper.find('li').text()).toContain('The cellos’ E2 left out');
    expect(wrapper.find('li').text()).toContain('90 → 20');
    await buttons(wrapper, '1 more move')[0]?.trigger('click');
    expect(wrapper.findAll('li')).toHaveLength(4);
  });

  it('when a move is heard, shown and tried, then that move is asked for', async () => {
    const wrapper = mountHelp();
    await buttons(wrapper, 'Hear')[1]?.trigger('click');
    await buttons(wrapper, 'Show')[1]?.trigger('click');
    await buttons(wrapper, 'Try')[1]?.trigger('click');
    for (const name of ['hear', 'show', 'try']) expect(wrapper.emitted(name)).toEqual([[moves[1]]]);
  });

  it('when the move that is shown is asked for again, then nothing is pointed out', async () => {
    const wrapper = mountHelp({ shown: keyOfMove(moveOf(cello, 20)) });
    await buttons(wrapper, 'Show')[0]?.trigger('click');
    expect(wrapper.emitted('show')).toEqual([[null]]);
  });

  it('when the study may only be read, then moves are heard and seen but not tried', () => {
    const wrapper = mountHelp({ mayTry: false });
    expect(buttons(wrapper, 'Try')).toHaveLength(0);
    expect(buttons(wrapper, 'Hear')).toHaveLength(3);
  });

  it('when no move is clear of the uncertainty, then that is said plainly', () => {
    const text = mountHelp({ moves: [] }).text();
    expect(text).toContain('No single move clears this chord by more than the figure’s own uncertainty.');
    expect(text).not.toContain('Locked');
    expect(mountHelp({ moves: [], locked: true }).text()).toContain('Locked notes stay');
  });

  it('when it clouds on purpose, then that is said and moves are offered only when asked for', async () => {
    const wrapper = mountHelp({ purpose: 'great' });
    expect(wrapper.text()).toContain('The great octave clouds on purpose.');
    expect(wrapper.findAll('li')).toHaveLength(0);
    await buttons(wrapper, 'What would clear it?')[0]?.trigger('click');
    expect(wrapper.emitted('ask')).toEqual([[true]]);
    await wrapper.setProps({ asked: true });
    expect(wrapper.findAll('li')).toHaveLength(3);
  });
});

describe('the mark of purpose', () => {
  it('when the chord or its cloudiest register is ticked, then that is to be kept', async () => {
    const wrapper = mount(OnPurpose, {
      props: { onPurpose: EMPTY_PURPOSE, register: 'great', readOnly: false },
    });
    const [whole, great] = wrapper.findAll('input');
    await whole?.setValue(true);
    await great?.setValue(true);
    expect(wrapper.emitted('set')).toEqual([
      ['chord', true],
      ['great', true],
    ]);
  });

  it('when the study may only be read, then what is meant is said and cannot be ticked', () => {
    const onPurpose = { ...EMPTY_PURPOSE, registers: ['great' as const] };
    const wrapper = mount(OnPurpose, { props: { onPurpose, register: 'great', readOnly: true } });
    expect(wrapper.text()).toBe('Clouds on purpose: the great octave.');
    expect(wrapper.find('input').exists()).toBe(false);
  });
});
