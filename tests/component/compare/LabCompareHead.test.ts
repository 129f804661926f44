import { flushPromises, mount } from '@vue/test-utils';
import { expect, it, vi } from 'vitest';
import { ref } from 'vue';
import type { PlaybackMode } from '@/composables/playback-signs';
import LabCompareHead from '@/pages/lab/compare/LabCompareHead.vue';
import { useCompareStore } from '@/stores/compare.store';
import { atTheDesk } from '../../support/open-study';

const playback = vi.hoisted(() => ({ now: {} as Record<string, unknown> }));
vi.mock('@/composables/playback', () => ({ usePlayback: () => playback.now }));

const ButtonStub = { props: ['label'], template: '<button>{{ label }}</button>' };

it('when X is pressed, then A sounds, then B, and the page says which', async () => {
  const mode = ref<PlaybackMode>('silent');
  const side = ref<'a' | 'b'>('a');
  const compareAB = vi.fn(async () => void (mode.value = 'compare'));
  playback.now = {
    mode,
    side,
    compareAB,
    switchTo: (to: 'a' | 'b') => void (side.value = to),
    stop: vi.fn(),
  };
  const { put } = atTheDesk();
  put('A2');
  useCompareStore().holdNow();
  put('C3');
  const wrapper = mount(LabCompareHead, {
    props: { naming: 'english' },
    global: { stubs: { 'q-btn': ButtonStub, 'q-icon': true } },
  });
  const press = async () => {
    document.dispatchEvent(new KeyboardEvent('keydown', { key: 'x', cancelable: true }));
    await flushPromises();
    return wrapper.get('.switch').text();
  };
  expect(wrapper.get('.switch').text()).toBe('Hear A, B');
  expect(await press()).toBe('Sounds: A');
  expect(await press()).toBe('Sounds: B');
  expect(compareAB).toHaveBeenCalledTimes(1);
  wrapper.unmount();
});
