import { useInfiniteQuery, useQuery, useQueryClient } from '@tanstack/vue-query';
import { computed, toValue, type MaybeRefOrGetter } from 'vue';
import type { ResponseOf } from '#shared/contracts/endpoint';
import type { listVersions as contract, readVersion as reading, Version } from '#shared/contracts/versions';
import { ApiError } from '@/api/api-error';
import { listVersions, nameVersion, readVersion } from '@/api/versions';

type Page = ResponseOf<typeof contract>;
export type VersionRead = ResponseOf<typeof reading>;

/** The versions of the study that lies open. */
export function useVersions(studyId: MaybeRefOrGetter<string>) {
  const client = useQueryClient();
  const key = computed(() => ['versions', toValue(studyId)]);
  const query = useInfiniteQuery({
    queryKey: computed(() => [...key.value, 'accepted']),
    queryFn: ({ pageParam }) => listVersions(toValue(studyId), { before: pageParam }),
    initialPageParam: undefined as number | undefined,
    getNextPageParam: (last: Page) => last.next ?? undefined,
    // Opened to see what there is now.
    staleTime: 0,
  });
  const aside = useQuery({
    queryKey: computed(() => [...key.value, 'set-aside']),
    queryFn: () => listVersions(toValue(studyId), { kind: 'set-aside', limit: 50 }),
    staleTime: 0,
  });
  const versions = computed<readonly Version[]>(
    () => query.data.value?.pages.flatMap((page) => page.versions) ?? [],
  );
  const trouble = computed(() => {
    const error = query.error.value ?? aside.error.value;
    return error instanceof ApiError ? error.message : null;
  });

  async function name(version: Version, given: string | null): Promise<void> {
    await nameVersion(toValue(studyId), version, { name: given });
    await client.invalidateQueries({ queryKey: key.value });
  }

  return {
    ...{ versions, trouble, name, isPending: query.isPending, hasMore: query.hasNextPage },
    setAside: computed<readonly Version[]>(() => aside.data.value?.versions ?? []),
    more: () => void query.fetchNextPage(),
    read: (version: Version): Promise<VersionRead> => readVersion(toValue(studyId), version),
  };
}
