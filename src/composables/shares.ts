import { useMutation, useQuery, useQueryClient } from '@tanstack/vue-query';
import { computed, toValue, type MaybeRefOrGetter } from 'vue';
import type { BodyOf } from '#shared/contracts/endpoint';
import type { createShare as contract, Share } from '#shared/contracts/shares';
import { ApiError } from '@/api/api-error';
import { createShare, deleteShare, listShares } from '@/api/shares';

/** With whom a study is shared, asked for while the reader looks at it. */
export function useShares(studyId: MaybeRefOrGetter<string | null>, isOpen: MaybeRefOrGetter<boolean>) {
  const client = useQueryClient();
  const id = computed(() => toValue(studyId) ?? '');
  const queryKey = computed(() => ['shares', id.value]);
  const query = useQuery({
    queryKey,
    queryFn: () => listShares(id.value),
    enabled: () => id.value !== '' && toValue(isOpen),
    select: (answer) => answer.shares,
  });
  const refresh = () => client.invalidateQueries({ queryKey: queryKey.value });

  async function share(body: BodyOf<typeof contract>): Promise<void> {
    await createShare(id.value, body);
    await refresh();
  }

  const revoking = useMutation({
    mutationFn: (entry: Share) => deleteShare(id.value, entry.id),
    onSettled: refresh,
  });
  const shares = computed<readonly Share[] | null>(() => query.data.value ?? null);
  const trouble = computed(() => {
    const error = query.error.value ?? revoking.error.value;
    return error instanceof ApiError ? error.message : null;
  });
  return { shares, trouble, share, revoke: (entry: Share) => revoking.mutate(entry) };
}
