import { useLocalStorage } from '@vueuse/core';
import { computed, type WritableComputedRef } from 'vue';
import {
  DEAL_WAYS,
  DEFAULT_DEAL,
  LOWEST_NOTES,
  TOP_TONES,
  type DealChoice,
} from '#shared/study/harmony/deal-choice';

const DEALING_KEY = 'siltline.dealing';

function known<Value extends string>(values: readonly Value[], value: unknown, otherwise: Value): Value {
  return values.find((one) => one === value) ?? otherwise;
}

/** How chords are dealt to the sections, kept in this browser. */
export function useDealing(): WritableComputedRef<DealChoice> {
  const kept = useLocalStorage<Partial<Record<keyof DealChoice, string>>>(DEALING_KEY, {});
  return computed({
    get: () => ({
      way: known(DEAL_WAYS, kept.value.way, DEFAULT_DEAL.way),
      top: known(TOP_TONES, kept.value.top, DEFAULT_DEAL.top),
      lowest: known(LOWEST_NOTES, kept.value.lowest, DEFAULT_DEAL.lowest),
    }),
    set: (choice) => (kept.value = { ...choice }),
  });
}
