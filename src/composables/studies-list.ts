import { useInfiniteQuery, useQuery, useQueryClient, type InfiniteData } from '@tanstack/vue-query';
import { computed, type Ref } from 'vue';
import type { ResponseOf } from '#shared/contracts/endpoint';
import type { listStudies as contract, Study, StudyRow } from '#shared/contracts/studies';
import { ApiError } from '@/api/api-error';
import { newRequestKey } from '@/api/request-key';
import {
  deleteStudy,
  duplicateStudy,
  listStudies,
  readStudyFilters,
  renameStudy,
  restoreStudy,
  setStudyTags,
} from '@/api/studies';
import type { StudiesFilters } from '@/composables/studies-filters';

type Page = ResponseOf<typeof contract>;
type Pages = InfiniteData<Page, string | undefined>;

const QUERY_KEY = ['studies'];
const PAGE = 20;
/** While figures are being worked out they are asked for again. */
const SUMMING_UP_MS = 2000;

/** Of a row what its newest save says; the figures follow. */
function renamedRow(row: StudyRow, { number, savedAt, document }: Study): StudyRow {
  return { ...row, number, savedAt, title: document.title, about: document.about, summedUp: false };
}

/** The studies that the reader may see, page by page, filtered and sorted by the server. */
export function useStudiesList(filters: Readonly<Ref<StudiesFilters>>) {
  const client = useQueryClient();
  const queryKey = computed(() => [...QUERY_KEY, 'list', filters.value]);
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
  const choices = useQuery({ queryKey: [...QUERY_KEY, 'filters'], queryFn: readStudyFilters });
  const rows = computed<readonly StudyRow[]>(
    () => query.data.value?.pages.flatMap(({ studies }) => studies) ?? [],
  );
  const trouble = computed(() => (query.error.value instanceof ApiError ? query.error.value.message : null));
  const refresh = () => client.invalidateQueries({ queryKey: QUERY_KEY });

  function change(alter: (rows: StudyRow[]) => StudyRow[]): void {
    client.setQueriesData<Pages>(
      { queryKey: [...QUERY_KEY, 'list'] },
      (data) =>
        data && { ...data, pages: data.pages.map((page) => ({ ...page, studies: alter(page.studies) })) },
    );
  }

  const changeRow = (row: StudyRow, alter: (row: StudyRow) => StudyRow) =>
    change((rows) => rows.map((other) => (other.id === row.id ? alter(other) : other)));

  async function rename(row: StudyRow, title: string): Promise<void> {
    const body = { title, basedOn: row.number, requestKey: newRequestKey() };
    const renamed = await renameStudy(row.id, body).finally(refresh);
    changeRow(row, (other) => renamedRow(other, renamed));
  }

  async function tag(row: StudyRow, tags: readonly string[]): Promise<void> {
    const set = await setStudyTags(row.id, { tags: [...tags] });
    changeRow(row, (other) => ({ ...other, tags: set.tags }));
    await refresh();
  }

  async function remove(row: StudyRow): Promise<void> {
    await deleteStudy(row.id);
    change((rows) => rows.filter(({ id }) => id !== row.id));
    void client.invalidateQueries({ queryKey: QUERY_KEY, refetchType: 'none' });
  }

  const restore = (studyId: string) => restoreStudy(studyId).then(refresh);
  const duplicate = (row: StudyRow) =>
    duplicateStudy(row.id, { requestKey: newRequestKey() }).finally(refresh);

  return {
    ...{ rows, trouble, rename, tag, remove, restore, duplicate },
    choices: computed(() => choices.data.value ?? { tags: [], keys: [] }),
    isPending: query.isPending,
    hasMore: query.hasNextPage,
    isLoadingMore: query.isFetchingNextPage,
    more: () => void query.fetchNextPage(),
    again: () => void query.refetch(),
  };
}
