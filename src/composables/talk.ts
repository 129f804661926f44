import { useMutation, useQuery, useQueryClient } from '@tanstack/vue-query';
import { computed, toValue, watch, type MaybeRefOrGetter } from 'vue';
import type { Anchor, Annotation } from '#shared/contracts/annotations';
import { ApiError } from '@/api/api-error';
import { createAnnotation, deleteAnnotation, listAnnotations } from '@/api/annotations';
import { newRequestKey } from '@/api/request-key';

/** While the talk is open, others' remarks appear within this time. */
const OPEN_MS = 4000;
const CLOSED_MS = 30_000;

/** The annotations of a study: those of others appear by themselves. */
export function useTalk(studyId: MaybeRefOrGetter<string | null>, isOpen: MaybeRefOrGetter<boolean>) {
  const client = useQueryClient();
  const id = computed(() => toValue(studyId) ?? '');
  const queryKey = computed(() => ['annotations', id.value]);
  const query = useQuery({
    queryKey,
    queryFn: () => listAnnotations(id.value),
    enabled: () => id.value !== '',
    refetchInterval: computed(() => (toValue(isOpen) ? OPEN_MS : CLOSED_MS)),
    select: (answer) => answer.annotations,
  });
  const refresh = () => client.invalidateQueries({ queryKey: queryKey.value });
  watch(
    () => toValue(isOpen),
    (opened) => opened && void refresh(),
  );
  const taking = useMutation({
    mutationFn: (annotation: Annotation) => deleteAnnotation(id.value, annotation.id),
    onSettled: refresh,
  });
  const write = useRemarkWriting(id, refresh);
  const annotations = computed<readonly Annotation[]>(() => query.data.value ?? []);
  const trouble = computed(() => messageOf(query.error.value) ?? messageOf(taking.error.value));
  return { annotations, trouble, write, remove: (annotation: Annotation) => taking.mutate(annotation) };
}

/** Sends a remark; tried again after a failure, the same words on the same thing keep their key. */
function useRemarkWriting(studyId: { readonly value: string }, refresh: () => Promise<void>) {
  const keys = new Map<string, string>();
  return async (text: string, anchor: Anchor): Promise<void> => {
    const said = JSON.stringify([studyId.value, anchor, text]);
    const requestKey = keys.get(said) ?? newRequestKey();
    keys.set(said, requestKey);
    await createAnnotation(studyId.value, { anchor, text, requestKey });
    keys.delete(said);
    await refresh();
  };
}

function messageOf(error: Error | null): string | null {
  return error instanceof ApiError ? error.message : null;
}
