import { mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, describe, expect, it } from 'vitest';
import { nextTick } from 'vue';
import { midiOfName } from '#shared/pitch/names';
import { DEFAULT_ENSEMBLE } from '#shared/study/study.document';
import { pitchAxis } from '@/charts/pitch-axis';
import LanesPane from '@/components/bench/LanesPane.vue';
import { analysisOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

const axis = pitchAxis([], 500, 40);

function lanesOf(line: string, props: Partial<InstanceType<typeof LanesPane>['$props']> = {}) {
  const chord = chordOf(line);
  const wrapper = mount(LanesPane, {
    props: {
      ...{ chord, axis, analysis: analysisOf(chord), ensemble: DEFAULT_ENSEMBLE },
      ...{ spelling: { tonic: 'C', mode: 'major' }, naming: 'english' },
      ...{ selectedId: null, markedIds: [], readOnly: false, a4Hz: 440 },
      ...props,
    },
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
  const token = (id: string) => wrapper.get(`[data-voice="${id}"]`);
  return { wrapper, token };
}

const pointer = (type: string, at: Partial<PointerEventInit>) =>
  new PointerEvent(type, { pointerId: 1, button: 0, bubbles: true, ...at });

afterEach(() => {
  document.body.innerHTML = '';
});

describe('the lanes', () => {
  it('when a chord is shown, then every note says what it is and stands at its pitch', () => {
    const { token } = lanesOf('DB D2, Vc A2');
    // A2 is 110 Hz.
    expect(token('note-2').attributes('aria-valuetext')).toBe('cellos, A 2, 110 Hz');
    const top = /top: ([\d.]+)px/.exec(token('note-2').attributes('style') ?? '')?.[1];
    expect(Number(top)).toBeCloseTo(axis.yOf(midiOfName('A2')), 3);
  });

  it('when the arrows are pressed on a note, then it moves by a semitone, an octave, or to the next section', async () => {
    const { wrapper, token } = lanesOf('Vc A2');
    await token('note-1').trigger('keydown', { key: 'ArrowUp' });
    await token('note-1').trigger('keydown', { key: 'ArrowDown', shiftKey: true });
    await token('note-1').trigger('keydown', { key: 'ArrowLeft' });
    expect(wrapper.emitted('move')).toEqual([
      ['note-1', midiOfName('A#2'), 'cello'],
      ['note-1', midiOfName('A1'), 'cello'],
      ['note-1', midiOfName('A2'), 'viola'],
    ]);
  });

  it('when Delete is pressed, then the note is taken away', async () => {
    const { wrapper, token } = lanesOf('Vc A2 F3');
    await token('note-1').trigger('keydown', { key: 'Delete' });
    expect(wrapper.emitted('remove')).toEqual([['note-1']]);
  });

  it('when Page Up is pressed, then the next note upwards has the focus', async () => {
    const { token } = lanesOf('Vc F3, DB D2');
    await token('note-2').trigger('keydown', { key: 'PageUp' });
    expect(document.activeElement).toBe(token('note-1').element);
  });

  it('when the reader tabs in, then one note alone is a stop', () => {
    const { wrapper } = lanesOf('DB D2, Vc A2 F3', { selectedId: 'note-2' });
    const stops = wrapper
      .findAll('[data-voice]')
      .map((note) => [note.attributes('data-voice'), note.attributes('tabindex')]);
    expect(stops).toEqual([
      ['note-1', '-1'],
      ['note-2', '0'],
      ['note-3', '-1'],
    ]);
  });

  it('when a note is dragged, then it snaps to semitones, as one gesture', async () => {
    const { wrapper, token } = lanesOf('Vc A2');
    const note = token('note-1').element;
    note.dispatchEvent(pointer('pointerdown', { clientX: 10, clientY: 300 }));
    note.dispatchEvent(pointer('pointermove', { clientX: 10, clientY: 300 - 3.2 * axis.semitone }));
    note.dispatchEvent(pointer('pointerup', { clientX: 10, clientY: 300 - 3.2 * axis.semitone }));
    expect(wrapper.emitted('gesture')).toEqual([['begin'], ['end']]);
    expect(wrapper.emitted('move')?.at(-1)).toEqual(['note-1', midiOfName('C3'), 'cello']);
  });

  it('when a press goes nowhere, then the note is selected and nothing moves', () => {
    const { wrapper, token } = lanesOf('Vc A2');
    const note = token('note-1').element;
    note.dispatchEvent(pointer('pointerdown', { clientX: 10, clientY: 300 }));
    note.dispatchEvent(pointer('pointerup', { clientX: 10, clientY: 301 }));
    expect(wrapper.emitted('select')).toEqual([['note-1']]);
    expect(wrapper.emitted('gesture')).toBeUndefined();
  });

  it('when Escape is pressed in a drag, then the drag is given up', () => {
    const { wrapper, token } = lanesOf('Vc A2');
    const note = token('note-1').element;
    note.dispatchEvent(pointer('pointerdown', { clientX: 10, clientY: 300 }));
    note.dispatchEvent(pointer('pointermove', { clientX: 10, clientY: 250 }));
    window.dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape' }));
    note.dispatchEvent(pointer('pointerup', { clientX: 10, clientY: 250 }));
    expect(wrapper.emitted('gesture')).toEqual([['begin'], ['cancel']]);
  });

  it('when a lane is clicked, then a note is put where the click was', async () => {
    const { wrapper } = lanesOf('');
    await wrapper.get('[data-lane="viola"]').trigger('click', { clientY: axis.yOf(60) - axis.strip });
    expect(wrapper.emitted('put')).toEqual([['viola', 60]]);
  });

  it('when a section’s head is pressed, then it begins with a note of its own', async () => {
    const { wrapper } = lanesOf('');
    const heads = wrapper.findAll('button');
    await heads.find((head) => head.text().includes('cellos'))?.trigger('click');
    expect(wrapper.emitted('put')).toEqual([['cello', null]]);
  });

  it('when a note lies out of reach, then it is shown and marked', () => {
    const { token } = lanesOf('Vc B1');
    expect(token('note-1').classes()).toContain('beyond');
    expect(token('note-1').attributes('aria-valuetext')).toContain('out of reach');
  });

  it('when a note is dragged, then its frequency and its strings are told', async () => {
    const { token } = lanesOf('Vc A2');
    const note = token('note-1').element;
    note.dispatchEvent(pointer('pointerdown', { clientX: 10, clientY: 300 }));
    note.dispatchEvent(pointer('pointermove', { clientX: 10, clientY: 290 }));
    await nextTick();
    // A2 lies on the cello's G string (G2) and, as a ninth above C2, high on the C string.
    expect(token('note-1').get('.told').text()).toContain('110 Hz, strings III');
    note.dispatchEvent(pointer('pointerup', { clientX: 10, clientY: 290 }));
  });

  it('when a note is clicked with Shift, then it is selected with the others and nothing is dragged', () => {
    const { wrapper, token } = lanesOf('Vc A2 F3', { selectedId: 'note-1' });
    token('note-2').element.dispatchEvent(pointer('pointerdown', { shiftKey: true }));
    expect(wrapper.emitted('choose')).toEqual([[{ kind: 'toggle', id: 'note-2' }]]);
  });

  it('when several are selected, then each is shown so, and Ctrl A and Escape ask for all and for one', async () => {
    const { wrapper, token } = lanesOf('Vc A2 F3', {
      selectedId: 'note-1',
      selectedIds: ['note-1', 'note-2'],
    });
    expect(token('note-2').classes()).toContain('selected');
    await token('note-1').trigger('keydown', { key: 'a', ctrlKey: true });
    await token('note-1').trigger('keydown', { key: 'Escape' });
    expect(wrapper.emitted('choose')).toEqual([[{ kind: 'all' }], [{ kind: 'one' }]]);
  });

  it('when the study may only be read, then nothing can be moved or put in', async () => {
    const { wrapper, token } = lanesOf('Vc A2', { readOnly: true });
    await token('note-1').trigger('keydown', { key: 'ArrowUp' });
    await wrapper.get('[data-lane="viola"]').trigger('click', { clientY: 100 });
    token('note-1').element.dispatchEvent(pointer('pointerdown', { clientY: 300 }));
    token('note-1').element.dispatchEvent(pointer('pointermove', { clientY: 200 }));
    expect(wrapper.emitted('move')).toBeUndefined();
    expect(wrapper.emitted('put')).toBeUndefined();
    expect(wrapper.emitted('gesture')).toBeUndefined();
  });
});
