import { useInfiniteQuery, useQueryClient } from '@tanstack/vue-query';
import { computed, type Ref } from 'vue';
import type { ResponseOf } from '#shared/contracts/endpoint';
import type { listShelf as contract, ShelfVoicing } from '#shared/contracts/shelf';
import { ApiError } from '@/api/api-error';
import { deleteVoicing, keepVoicing, listShelf, renameVoicing } from '@/api/shelf';

type Page = ResponseOf<typeof contract>;
const QUERY_KEY = ['shelf'];

/** The reader's shelf: voicings kept to be used again. */
export function useShelf(search: Readonly<Ref<string>>) {
  const client = useQueryClient();
  const query = useInfiniteQuery({
    queryKey: computed(() => [...QUERY_KEY, search.value]),
    queryFn: ({ pageParam }) =>
      listShelf({ after: pageParam, ...(search.value && { search: search.value }) }),
    initialPageParam: undefined as string | undefined,
    shallow: true,
    placeholderData: (before) => before,
    getNextPageParam: (last: Page) => last.next ?? undefined,
  });
  const voicings = computed<readonly ShelfVoicing[]>(
    () => query.data.value?.pages.flatMap((page) => page.voicings) ?? [],
  );
  const trouble = computed(() => (query.error.value instanceof ApiError ? query.error.value.message : null));
  const refresh = () => client.invalidateQueries({ queryKey: QUERY_KEY });
  return {
    ...{ voicings, trouble, isPending: query.isPending, hasMore: query.hasNextPage },
    more: () => void query.fetchNextPage(),
    keep: (body: Parameters<typeof keepVoicing>[0]) => keepVoicing(body).then(refresh),
    rename: (id: string, name: string) => renameVoicing(id, { name }).then(refresh),
    remove: (id: string) => deleteVoicing(id).then(refresh),
  };
}
