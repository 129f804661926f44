import { createGlobalState, StorageSerializers, useLocalStorage } from '@vueuse/core';
import { computed, shallowRef } from 'vue';
import type { DrivenTour } from '@/composables/tour-drive';
import { TOUR_STEPS } from '@/composables/tour-steps';

/** What this browser keeps: at which step the tour was left, or that it was gone through. */
interface KeptTour {
  readonly left?: unknown;
  readonly done?: unknown;
}

/** Where the focus goes when whoever had it is gone: to the sound of what the tour spoke of, or to the notes. */
const AFTERWARDS = '[data-place="playback"] button:not(:disabled), [data-notes-line]';

function giveFocusBack(opener: Element | null): void {
  const isThere = opener instanceof HTMLElement && opener.isConnected && opener !== document.body;
  const target = isThere ? opener : document.querySelector<HTMLElement>(AFTERWARDS);
  target?.focus();
}

/**
 * The tour of the Lab. It never starts by itself: somebody asks for it, can leave it at any step, and
 * finds it again where they left it.
 */
export const useTour = createGlobalState(() => {
  const kept = useLocalStorage<KeptTour | null>('siltline.tour', null, {
    serializer: StorageSerializers.object,
  });
  const underWay = shallowRef<DrivenTour | 'coming' | null>(null);

  const isDone = computed(() => kept.value?.done === true);
  /** The step that it was left at, 0 the first; null where it was not begun, or gone through. */
  const leftAt = computed(() => {
    const left = kept.value?.left;
    const isStep = typeof left === 'number' && Number.isInteger(left) && left > 0 && left < TOUR_STEPS.length;
    return isStep ? left : null;
  });
  const label = computed(() => (leftAt.value === null ? 'Tour' : `Tour, from step ${leftAt.value + 1}`));

  /** @param prepare lays out what the tour speaks of, before its first step */
  async function start(prepare: () => Promise<void>): Promise<void> {
    if (underWay.value !== null) return;
    underWay.value = 'coming';
    const opener = document.activeElement;
    try {
      const { driveTour } = await import('@/composables/tour-drive');
      await prepare();
      const tour = driveTour(leftAt.value ?? 0, (step) => (kept.value = { left: step, done: isDone.value }));
      underWay.value = tour;
      if (await tour.over) kept.value = { left: null, done: true };
    } finally {
      underWay.value = null;
      giveFocusBack(opener);
    }
  }

  /** Whoever goes to another page leaves the tour. */
  function leave(): void {
    if (underWay.value !== null && underWay.value !== 'coming') underWay.value.leave();
  }

  return { isDone, leftAt, label, start, leave };
});
