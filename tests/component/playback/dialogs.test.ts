import { flushPromises, mount, type VueWrapper } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import ListeningCheckDialog from '@/components/playback/ListeningCheckDialog.vue';
import WavProgress from '@/components/playback/WavProgress.vue';
import { usePlayback } from '@/composables/playback';
import { SilentEngine } from '../../support/silent-engine';

const engine = new SilentEngine();
vi.mock('@/audio/tone-engine', () => ({ createSoundEngine: () => engine }));

let dialog: VueWrapper | null = null;

function button(label: string): HTMLElement {
  const found = [...document.querySelectorAll('button')].find(
    ({ textContent }) => textContent.trim() === label,
  );
  if (!found) throw new Error(`no button ${label}`);
  return found;
}

async function press(label: string): Promise<void> {
  button(label).click();
  await flushPromises();
}

beforeEach(() => {
  localStorage.clear();
  usePlayback().setVolume(-10);
  dialog = mount(ListeningCheckDialog, { global: { plugins: [Quasar] }, attachTo: document.body });
});

afterEach(() => {
  dialog?.unmount();
  document.body.innerHTML = '';
});

describe('the listening check', () => {
  it('when it opens, then it warns, is quiet, and begins only after the first note has been tried', async () => {
    expect(document.body.textContent).toContain('Headphones can hurt');
    expect(usePlayback().volume.value).toBe(-24);
    expect(button('It is comfortable: begin').hasAttribute('disabled')).toBe(true);
    await press('Sound the first note');
    expect(engine.schedule[0]?.sounds[0]?.pitch).toBe('C4');
    expect(button('It is comfortable: begin').hasAttribute('disabled')).toBe(false);
  });

  it('when no note is heard twice, then that is said and remembered', async () => {
    await press('Sound the first note');
    await press('It is comfortable: begin');
    await press('I hear nothing');
    await press('I hear nothing');
    expect(document.body.textContent).toContain('was heard with none of the notes');
    expect(JSON.parse(localStorage.getItem('siltline.playback.reach') ?? '')).toEqual({ lowest: null });
  });

  it('when everything is said to be heard, then the silence gives it away and nothing is remembered', async () => {
    await press('Sound the first note');
    await press('It is comfortable: begin');
    while (document.body.textContent.includes('I hear it')) await press('I hear it');
    expect(document.body.textContent).toContain('does not count');
    expect(localStorage.getItem('siltline.playback.reach')).toBeNull();
    await press('Check again');
    expect(document.body.textContent).toContain('It begins quietly');
  });

  it('when it is closed, then the volume is what it was', () => {
    dialog?.unmount();
    dialog = null;
    expect(usePlayback().volume.value).toBe(-10);
  });
});

describe('the progress of a file', () => {
  const rest = { done: 0.4, gain: null, address: undefined, name: 'Study.wav' };

  it('when a file is being made, then its progress stands there, and it can be stopped', async () => {
    const wrapper = mount(WavProgress, {
      props: { ...rest, status: 'making' },
      global: { plugins: [Quasar] },
    });
    expect(wrapper.text()).toContain('40 %');
    await wrapper.get('button').trigger('click');
    expect(wrapper.emitted('stop')).toHaveLength(1);
  });

  it('when it is ready, then it says by how much it was raised, and offers it under its name', () => {
    const props = { ...rest, status: 'ready' as const, gain: 11.3, address: 'blob:there' };
    const wrapper = mount(WavProgress, { props, global: { plugins: [Quasar] } });
    expect(wrapper.text()).toContain('raised by 11 dB');
    expect(wrapper.get('a').attributes('download')).toBe('Study.wav');
  });
});
