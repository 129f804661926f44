import { useInfiniteQuery, useQueryClient, type InfiniteData } from '@tanstack/vue-query';
import { computed } from 'vue';
import type { ResponseOf } from '#shared/contracts/endpoint';
import type { listStudies as contract, StudyRow } from '#shared/contracts/studies';
import { ApiError } from '@/api/api-error';
import { newRequestKey } from '@/api/request-key';
import { createStudy, deleteStudy, listStudies, renameStudy, restoreStudy } from '@/api/studies';

type Page = ResponseOf<typeof contract>;
type Pages = InfiniteData<Page, string | undefined>;

const QUERY_KEY = ['studies'];
const PAGE = 20;

/** The studies that the reader may see, the newest save first, page by page. */
export function useStudiesList() {
  const client = useQueryClient();
  const query = useInfiniteQuery({
    queryKey: QUERY_KEY,
    queryFn: ({ pageParam }) => listStudies({ after: pageParam, limit: PAGE }),
    initialPageParam: undefined as string | undefined,
    // Documents are only read: watching them deeply would cost more than drawing them.
    shallow: true,
    getNextPageParam: (last: Page) => last.next ?? undefined,
  });
  const rows = computed<readonly StudyRow[]>(
    () => query.data.value?.pages.flatMap(({ studies }) => studies) ?? [],
  );
  const trouble = computed(() => (query.error.value instanceof ApiError ? query.error.value.message : null));
  const refresh = () => client.invalidateQueries({ queryKey: QUERY_KEY });

  function change(alter: (rows: StudyRow[]) => StudyRow[]): void {
    client.setQueryData<Pages>(
      QUERY_KEY,
      (data) =>
        data && { ...data, pages: data.pages.map((page) => ({ ...page, studies: alter(page.studies) })) },
    );
  }

  async function rename(row: StudyRow, title: string): Promise<void> {
    const body = { title, basedOn: row.number, requestKey: newRequestKey() };
    const renamed = await renameStudy(row.id, body).finally(refresh);
    change((rows) => rows.map((other) => (other.id === row.id ? renamed : other)));
  }

  async function remove(row: StudyRow): Promise<void> {
    await deleteStudy(row.id);
    change((rows) => rows.filter(({ id }) => id !== row.id));
  }

  const restore = (row: StudyRow) => restoreStudy(row.id).then(refresh);
  const duplicate = (row: StudyRow, title: string) =>
    createStudy({ document: { ...row.document, title }, requestKey: newRequestKey() }).then(refresh);

  return {
    ...{ rows, trouble, rename, remove, restore, duplicate },
    isPending: query.isPending,
    hasMore: query.hasNextPage,
    isLoadingMore: query.isFetchingNextPage,
    more: () => void query.fetchNextPage(),
    again: () => void query.refetch(),
  };
}
