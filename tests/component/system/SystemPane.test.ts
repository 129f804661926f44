import { mount } from '@vue/test-utils';
import { nextTick, shallowRef } from 'vue';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { midiOfName } from '#shared/pitch/names';
import { newStudy } from '#shared/study/new-study';
import { pitchAxis } from '@/charts/pitch-axis';
import SystemPane from '@/components/system/SystemPane.vue';
import type { StaffSketch } from '@/engraving/staff-sketch';
import { chordOf } from '../../support/typed-chords';

/** Which staves were drawn, by their width and clef; the engraver itself needs a browser's fonts. */
const drawn = vi.hoisted(() => ({ sketches: new Array<StaffSketch>() }));

vi.mock('@/composables/engraver', () => ({
  useEngraver: () => ({ engraver: shallowRef({}), failed: shallowRef(false) }),
}));
vi.mock('@/engraving/draw-staff', () => ({
  drawStaff: (_: unknown, sketch: StaffSketch) => {
    drawn.sketches.push(sketch);
    const heads = sketch.events.map(({ chord, x }) =>
      (chord?.notes ?? []).map(({ voiceId }, index) => ({
        voiceId,
        left: x,
        right: x + 12,
        y: 40 - index * 5,
      })),
    );
    return { element: document.createElementNS('http://www.w3.org/2000/svg', 'g'), heads };
  },
}));

const axis = pitchAxis([], 460, 40);
const LINE = 'DB D2, Vc A2 F3, Va A3, Vn2 D4, Vn1 A4';

function pane(line: string, selectedId: string | null = null) {
  const study = newStudy('chord-0');
  return mount(SystemPane, {
    props: { chord: chordOf(line), study, naming: 'english', axis, selectedId },
  });
}

function lastY(path: string | undefined): number {
  return Number(path?.match(/-?[\d.]+/g)?.at(-1));
}

afterEach(() => {
  drawn.sketches.length = 0;
});

describe('the system', () => {
  it('when a chord is shown, then a leader of each note ends at its height on the axis', async () => {
    const wrapper = pane(LINE);
    await nextTick();
    const ends = wrapper.findAll('[data-leader]').map((leader) => lastY(leader.get('path').attributes('d')));
    const heights = ['D2', 'A2', 'F3', 'A3', 'D4', 'A4'].map((name) => axis.yOf(midiOfName(name)));
    expect(ends).toEqual(heights);
  });

  it('when the axis moves, then the leaders end at the new heights and no staff is drawn anew', async () => {
    const wrapper = pane('Vc A2');
    await nextTick();
    const before = drawn.sketches.length;
    const moved = { ...axis, yOf: (midi: number) => axis.yOf(midi) + 7 };
    await wrapper.setProps({ axis: moved });
    const end = lastY(wrapper.get('[data-leader] path').attributes('d'));
    expect(end).toBeCloseTo(axis.yOf(midiOfName('A2')) + 7, 6);
    expect(drawn.sketches).toHaveLength(before);
  });

  it('when one note moves, then its own staff alone is drawn anew', async () => {
    const wrapper = pane(LINE);
    await nextTick();
    drawn.sketches.length = 0;
    await wrapper.setProps({ chord: chordOf(LINE.replace('A3', 'B3')) });
    expect(drawn.sketches.map(({ clef }) => clef)).toEqual(['alto']);
  });

  it('when a note is selected, then its leader and its head are marked', async () => {
    const wrapper = pane(LINE, 'note-2');
    await nextTick();
    expect(wrapper.findAll('.selected').map((leader) => leader.attributes('data-leader'))).toEqual([
      'note-2',
    ]);
    expect(wrapper.findAll('.ring')).toHaveLength(1);
  });

  it('when it is read and not seen, then the staves are told and nothing takes the focus', () => {
    const wrapper = pane('DB D2');
    expect(wrapper.get('svg').attributes('aria-hidden')).toBe('true');
    expect(wrapper.findAll('li').at(-1)?.text()).toBe('Double basses, bass clef: D 2.');
    expect(wrapper.findAll('button, a, [tabindex]')).toHaveLength(0);
  });
});
