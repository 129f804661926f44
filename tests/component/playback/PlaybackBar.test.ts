import { flushPromises, mount, type VueWrapper } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import PlaybackBar from '@/components/playback/PlaybackBar.vue';
import { usePlayback } from '@/composables/playback';
import { SilentEngine } from '../../support/silent-engine';
import { seriesOn, voiceSound } from '../../support/sounds';

const engine = new SilentEngine();
vi.mock('@/audio/tone-engine', () => ({ createSoundEngine: () => engine }));

const low = voiceSound('low-voice', { pitch: 'D2', midi: 38, partials: seriesOn(73.4, [6, 0]) });
const high = voiceSound('high-voice', {
  section: 'violin1',
  pitch: 'Bb4',
  midi: 70,
  partials: seriesOn(466.2, [0]),
});

let bar: VueWrapper | null = null;

function mountBar(sounds = [low, high], outside = '') {
  document.body.innerHTML = outside;
  const progression = [{ chordId: 'first-chord', beats: 1, sounds }];
  bar = mount(PlaybackBar, {
    props: { sounds, progression, tempoBpm: 60 },
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
  return bar;
}

function buttonOf(wrapper: VueWrapper, label: string) {
  const button = wrapper
    .findAll('button')
    .find((candidate) => candidate.attributes('aria-label') === label || candidate.text().trim() === label);
  if (!button) throw new Error(`no button ${label}`);
  return button;
}

function press(key: string, on: Element = document.body): void {
  on.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
}

beforeEach(() => {
  localStorage.clear();
});

afterEach(() => {
  usePlayback().silence();
  bar?.unmount();
  bar = null;
});

describe('PlaybackBar', () => {
  it('when play is pressed, then the chord is struck, and stop ends it', async () => {
    const wrapper = mountBar();
    await buttonOf(wrapper, 'Play chord').trigger('click');
    await vi.waitFor(() => expect(engine.state).toBe('playing'));
    await vi.waitFor(() => expect(buttonOf(wrapper, 'Stop').attributes('disabled')).toBeUndefined());
    await buttonOf(wrapper, 'Stop').trigger('click');
    expect(engine.state).toBe('silent');
  });

  it('when hold is pressed, then it shows as pressed, and once more ends it', async () => {
    const wrapper = mountBar();
    await buttonOf(wrapper, 'Hold').trigger('click');
    await vi.waitFor(() => expect(buttonOf(wrapper, 'Hold').attributes('aria-pressed')).toBe('true'));
    expect(engine.held).toEqual([low, high]);
    await buttonOf(wrapper, 'Hold').trigger('click');
    expect(engine.state).toBe('silent');
    expect(buttonOf(wrapper, 'Hold').attributes('aria-pressed')).toBe('false');
  });

  it('when the chord has no notes, then there is nothing to play', () => {
    const wrapper = mountBar([]);
    for (const label of ['Play chord', 'Hold', 'Build up', 'Play progression', 'Stop']) {
      expect(buttonOf(wrapper, label).attributes('disabled')).toBeDefined();
    }
  });

  it('when the space bar is pressed outside of fields, then it plays, and stops', async () => {
    mountBar();
    press(' ');
    await vi.waitFor(() => expect(usePlayback().mode.value).toBe('strike'));
    press(' ');
    expect(engine.state).toBe('silent');
  });

  it('when the space bar is pressed in a field or on a button, then it stays with them', async () => {
    const wrapper = mountBar([low, high], '<input id="line" />');
    const field = document.querySelector('#line');
    if (!field) throw new Error('no field');
    press(' ', field);
    press(' ', buttonOf(wrapper, 'Hold').element);
    await flushPromises();
    expect(engine.state).toBe('silent');
    expect(usePlayback().status.value).not.toBe('loading');
  });

  it('when Escape is pressed, even in a field, then everything is silent at once', async () => {
    const wrapper = mountBar([low, high], '<input id="line" />');
    const field = document.querySelector('#line');
    if (!field) throw new Error('no field');
    await buttonOf(wrapper, 'Hold').trigger('click');
    await vi.waitFor(() => expect(engine.state).toBe('held'));
    const before = engine.silenced;
    press('Escape', field);
    expect(engine.silenced).toBe(before + 1);
    expect(engine.state).toBe('silent');
  });

  it('when the volume is moved, then the engine follows and the figure says so', async () => {
    const wrapper = mountBar();
    await buttonOf(wrapper, 'Hold').trigger('click');
    await vi.waitFor(() => expect(engine.state).toBe('held'));
    await wrapper.get('input[type="range"]').setValue(-18);
    expect(engine.volume).toBe(-18);
    expect(wrapper.get('output').text()).toBe('−18 dB');
  });

  it('when the progression plays, then the bar tells where it is', async () => {
    const wrapper = mountBar();
    await buttonOf(wrapper, 'Play progression').trigger('click');
    await vi.waitFor(() => expect(engine.state).toBe('playing'));
    engine.head = 'first-chord';
    await vi.waitFor(() => expect(wrapper.emitted('playhead')).toEqual([['first-chord']]));
  });

  it('when one pair is heard, then the bar names it and offers the whole chord', async () => {
    const wrapper = mountBar();
    await usePlayback().hear({ kind: 'pair', lowerId: low.id, upperId: high.id });
    await wrapper.vm.$nextTick();
    expect(wrapper.text()).toContain('Only Vc D2 with Vn I B♭4');
    await buttonOf(wrapper, 'Whole chord').trigger('click');
    expect(usePlayback().listening.value).toEqual({ kind: 'chord' });
  });

  it('when the page is left, then nothing goes on sounding', async () => {
    const wrapper = mountBar();
    await buttonOf(wrapper, 'Hold').trigger('click');
    await vi.waitFor(() => expect(engine.state).toBe('held'));
    wrapper.unmount();
    bar = null;
    expect(engine.state).toBe('silent');
  });
});

describe('the cautions', () => {
  it('when playback is met for the first time, then the page warns of headphones until that is understood', async () => {
    const wrapper = mountBar();
    expect(wrapper.text()).toContain('Headphones can hurt');
    await buttonOf(wrapper, 'Understood').trigger('click');
    expect(wrapper.text()).not.toContain('Headphones can hurt');
    wrapper.unmount();
    expect(mountBar().text()).not.toContain('Headphones can hurt');
  });

  it('when the chord lies low, then the page says that small loudspeakers do not sound it', () => {
    localStorage.setItem('siltline.playback.cautioned', 'true');
    expect(mountBar([low, high]).text()).toContain('Laptops and phones do not sound the lowest octaves');
    bar?.unmount();
    expect(mountBar([high]).text()).not.toContain('Laptops and phones');
  });
});
