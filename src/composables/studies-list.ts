import { useInfiniteQuery, useQuery } from '@tanstack/vue-query';
import { computed, type Ref } from 'vue';
import type { StudyRow } from '#shared/contracts/studies';
import { ApiError } from '@/api/api-error';
import { listStudies, readStudyFilters } from '@/api/studies';
import { STUDIES_KEY, useStudyChanges, type Page } from '@/composables/study-changes';
import type { StudiesFilters } from '@/composables/studies-filters';

const PAGE = 20;
/** While figures are being worked out they are asked for again. */
const SUMMING_UP_MS = 2000;

/** The studies that the reader may see, page by page, filtered and sorted by the server. */
export function useStudiesList(filters: Readonly<Ref<StudiesFilters>>) {
  const queryKey = computed(() => [...STUDIES_KEY, 'list', filters.value]);
  const query = useInfiniteQuery({
    queryKey,
    queryFn: ({ pageParam }) => listStudies({ ...filters.value, after: pageParam, limit: PAGE }),
    initialPageParam: undefined as string | undefined,
    shallow: true,
    // The rows of the last filter stay until those of the next have come.
    placeholderData: (before) => before,
    getNextPageParam: (last: Page) => last.next ?? undefined,
    refetchInterval: ({ state }) =>
      state.data?.pages.some(({ studies }) => studies.some(({ summedUp }) => !summedUp))
        ? SUMMING_UP_MS
        : false,
  });
  const choices = useQuery({ queryKey: [...STUDIES_KEY, 'filters'], queryFn: readStudyFilters });
  const rows = computed<readonly StudyRow[]>(
    () => query.data.value?.pages.flatMap(({ studies }) => studies) ?? [],
  );
  const trouble = computed(() => (query.error.value instanceof ApiError ? query.error.value.message : null));
  const changes = useStudyChanges();

  return {
    ...{ rows, trouble },
    ...changes,
    choices: computed(() => choices.data.value ?? { tags: [], keys: [] }),
    isPending: query.isPending,
    hasMore: query.hasNextPage,
    isLoadingMore: query.isFetchingNextPage,
    more: () => void query.fetchNextPage(),
    again: () => void query.refetch(),
  };
}
