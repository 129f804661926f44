import { useNow } from '@vueuse/core';
import { computed, type ComputedRef } from 'vue';

const EVERY_MS = 20_000;

/** The reader's present and place in time, for everything that says when something was. */
export interface ReadersNow {
  readonly now: Date;
  readonly timeZone: string;
}

export function useReadersNow(): ComputedRef<ReadersNow> {
  const now = useNow({ interval: EVERY_MS });
  const { timeZone } = Intl.DateTimeFormat().resolvedOptions();
  return computed(() => ({ now: now.value, timeZone }));
}
