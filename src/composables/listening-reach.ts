import { StorageSerializers, useLocalStorage } from '@vueuse/core';
import { computed, type WritableComputedRef } from 'vue';
import { CHECK_NOTES, type Reach } from '@/audio/listening-check';

const REACH_KEY = 'siltline.playback.reach';

/** How low this device's loudspeaker was heard to go, kept in this browser; null until it has been checked. */
export function useListeningReach(): WritableComputedRef<Reach | null> {
  const kept = useLocalStorage<{ lowest?: unknown } | null>(REACH_KEY, null, {
    serializer: StorageSerializers.object,
  });
  return computed({
    get: () => {
      if (kept.value === null || typeof kept.value !== 'object') return null;
      const { lowest } = kept.value;
      return { lowest: CHECK_NOTES.find((note) => note === lowest) ?? null };
    },
    set: (reach) => (kept.value = reach),
  });
}
