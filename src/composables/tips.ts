import { useLocalStorage } from '@vueuse/core';
import { computed, ref, watch } from 'vue';
import { tipFor } from '#shared/voicing/tips/trade-tips';
import type { TipFacts } from '#shared/voicing/tips/tip';

/** The tip for a chord, at most one, and which tips this device is not to show again. */
export function useTips(facts: () => TipFacts) {
  const putAway = useLocalStorage<string[]>('siltline.tips.put-away', []);
  /** One tip was put away just now: the next waits until the chord has changed. */
  const rests = ref(false);
  const tip = computed(() => (rests.value ? null : tipFor(facts(), putAway.value)));

  function putTipAway(): void {
    if (!tip.value) return;
    putAway.value = [...putAway.value, tip.value.id];
    rests.value = true;
  }

  watch(
    () => facts().chord.voices,
    () => (rests.value = false),
  );
  return { tip, putTipAway };
}
