import { refDebounced } from '@vueuse/core';
import { computed, ref, shallowRef, watch } from 'vue';
import { ApiError } from '@/api/api-error';
import type { LoadStatus } from '@/api/load-status';
import type { VoicingGroup, VoicingSource } from '@/composables/voicing-sources';

/** A search is asked for once the typing has rested. */
const REST_MS = 250;

/** The groups of a source, page by page, of all or of what is searched for. */
export function useSourcePages(source: () => VoicingSource) {
  const groups = shallowRef<readonly VoicingGroup[]>([]);
  const next = ref<string | null>(null);
  const status = ref<LoadStatus>('idle');
  const trouble = ref<string | null>(null);
  const query = ref('');
  const rested = refDebounced(query, REST_MS);
  /** What is being read: an answer to an older question is let fall. */
  let question = 0;

  async function read(after: string | null): Promise<void> {
    const mine = (question += 1);
    status.value = 'loading';
    trouble.value = null;
    try {
      const page = await source().page(rested.value.trim(), after);
      if (mine !== question) return;
      groups.value = after === null ? page.groups : [...groups.value, ...page.groups];
      next.value = page.next;
      status.value = 'ready';
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      if (mine !== question) return;
      trouble.value = error.message;
      status.value = 'error';
    }
  }

  function begin(): void {
    groups.value = [];
    next.value = null;
    if (source().unavailable() === null) void read(null);
    else status.value = 'idle';
  }

  function more(): void {
    if (status.value !== 'loading' && next.value !== null) void read(next.value);
  }

  watch(source, () => (query.value = ''));
  watch([source, rested], begin, { immediate: true });
  return { groups, query, status, trouble, hasMore: computed(() => next.value !== null), more, again: begin };
}
