import { defineStore } from 'pinia';
import { ref, shallowRef } from 'vue';
import type { Chord } from '#shared/study/study.document';

/** Whether the shelf is open, and what is to be kept on it. */
export const useShelfStore = defineStore('shelf', () => {
  const isOpen = ref(false);
  const toKeep = shallowRef<Chord | null>(null);

  function open(chord: Chord | null = null): void {
    toKeep.value = chord;
    isOpen.value = true;
  }

  return { isOpen, toKeep, open };
});
