import { computed, ref, shallowRef, watch } from 'vue';
import { ApiError } from '@/api/api-error';
import type { LoadStatus } from '@/api/load-status';
import type { VoicingGroup, VoicingSource } from '@/composables/voicing-sources';

/** As many pages as are read by themselves while somebody searches. */
const MOST_PAGES = 20;

/** The groups of a source, page by page; a search reads on until the end. */
export function useSourcePages(source: () => VoicingSource) {
  const groups = shallowRef<readonly VoicingGroup[]>([]);
  const next = ref<string | null>(null);
  const status = ref<LoadStatus>('idle');
  const trouble = ref<string | null>(null);
  const query = ref('');
  let pages = 0;

  async function read(from: VoicingSource, after: string | null): Promise<void> {
    status.value = 'loading';
    trouble.value = null;
    try {
      const page = await from.page(after);
      if (from !== source()) return;
      pages += 1;
      groups.value = [...groups.value, ...page.groups];
      next.value = page.next;
      status.value = 'ready';
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      if (from !== source()) return;
      trouble.value = error.message;
      status.value = 'error';
    }
  }

  function begin(): void {
    groups.value = [];
    next.value = null;
    query.value = '';
    pages = 0;
    status.value = 'idle';
    if (source().unavailable() === null) void read(source(), null);
  }

  function more(): void {
    if (status.value !== 'loading' && next.value !== null) void read(source(), next.value);
  }

  const words = computed(() => query.value.trim().toLocaleLowerCase());
  const found = computed(() =>
    groups.value.filter(({ title }) => title.toLocaleLowerCase().includes(words.value)),
  );
  watch(source, begin, { immediate: true });
  watch([words, status], () => {
    if (words.value !== '' && status.value === 'ready' && pages < MOST_PAGES) more();
  });

  return { found, query, status, trouble, hasMore: computed(() => next.value !== null), more, again: begin };
}
