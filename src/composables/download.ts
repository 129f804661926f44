import { useObjectUrl } from '@vueuse/core';
import { computed, type Ref } from 'vue';

const INDENT = 2;

/** An address under which the browser hands out a value as a JSON file. */
export function useJsonFile(value: () => unknown): Readonly<Ref<string | undefined>> {
  return useObjectUrl(
    computed(() => new Blob([JSON.stringify(value(), null, INDENT)], { type: 'application/json' })),
  );
}
