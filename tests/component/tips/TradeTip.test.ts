import { mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import LabTip from '@/pages/lab/LabTip.vue';
import { analysisOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

/** A chord of which two tips can be told: that basses sound lower, and that cellos stand over them. */
function propsOf(line: string) {
  const chord = chordOf(line);
  return { chord, analysis: analysisOf(chord), naming: 'english' } as const;
}

function mountTip(line: string) {
  return mount(LabTip, {
    props: propsOf(line),
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
}

beforeEach(() => localStorage.clear());
afterEach(() => {
  document.body.innerHTML = '';
});

describe('the tip', () => {
  it('when several matter, then one is shown with where it is from', () => {
    const text = mountTip('DB C2, Vc C3').text();
    expect(text).toContain('Cellos an octave over the basses');
    expect(text).toContain('Common practice');
    expect(text).not.toContain('than written');
  });

  it('when it is put away, then nothing takes its place until the chord changes, and the focus stays there', async () => {
    const wrapper = mountTip('DB C2, Vc C3');
    await wrapper.get('button').trigger('click');
    expect(wrapper.find('button').exists()).toBe(false);
    expect(document.activeElement).toBe(wrapper.element);
    expect(wrapper.get('[role="status"]').text()).toBe('This tip is not shown again.');

    await wrapper.setProps(propsOf('DB D2, Vc D3'));
    expect(wrapper.text()).toContain('than written');
  });

  it('when it was put away, then a later visit does not show it either', async () => {
    const first = mountTip('DB C2, Vc C3');
    await first.get('button').trigger('click');
    first.unmount();
    expect(mountTip('DB C2, Vc C3').text()).not.toContain('Cellos an octave over');
  });

  it('when nothing matters, then the place is empty', () => {
    expect(mountTip('Va C4').text()).toBe('');
  });
});
