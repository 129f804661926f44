import { useInfiniteQuery, useQueryClient } from '@tanstack/vue-query';
import { computed } from 'vue';
import type { ResponseOf } from '#shared/contracts/endpoint';
import type { listDeletedStudies as contract } from '#shared/contracts/studies';
import { ApiError } from '@/api/api-error';
import { listDeletedStudies, restoreStudy } from '@/api/studies';
import { STUDIES_KEY } from '@/composables/study-changes';

type Page = ResponseOf<typeof contract>;
export type DeletedStudy = Page['studies'][number];

/** What lies in the reader's trash, the last deleted first. */
export function useDeletedStudies() {
  const client = useQueryClient();
  const query = useInfiniteQuery({
    queryKey: [...STUDIES_KEY, 'deleted'],
    queryFn: ({ pageParam }) => listDeletedStudies({ after: pageParam }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last: Page) => last.next ?? undefined,
  });
  const studies = computed<readonly DeletedStudy[]>(
    () => query.data.value?.pages.flatMap((page) => page.studies) ?? [],
  );
  const trouble = computed(() => (query.error.value instanceof ApiError ? query.error.value.message : null));
  return {
    ...{ studies, trouble, isPending: query.isPending, hasMore: query.hasNextPage },
    more: () => void query.fetchNextPage(),
    again: () => void query.refetch(),
    restore: (studyId: string) =>
      restoreStudy(studyId).then(() => client.invalidateQueries({ queryKey: STUDIES_KEY })),
  };
}
