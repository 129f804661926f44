import { watch } from 'vue';
import { useRoute, useRouter } from 'vue-router';
import { useBenchStore } from '@/stores/bench.store';
import { useStudyStore } from '@/stores/study.store';

/** Opens what the address names unless it lies open, and keeps the chosen chord in the address. */
export function useStudyHere() {
  const route = useRoute();
  const router = useRouter();
  const study = useStudyStore();
  const bench = useBenchStore();

  watch(
    () => route.params.studyId,
    (studyId) => {
      if (typeof studyId === 'string') {
        if (study.study?.id !== studyId) void study.open(studyId);
      } else if (!bench.holdsDraft || study.study) study.openDraft();
    },
    { immediate: true },
  );
  watch(
    [() => route.query.chord, () => study.status],
    ([chordId]) => {
      if (typeof chordId === 'string') bench.selectChord(chordId);
    },
    { immediate: true },
  );

  async function choose(chordId: string): Promise<void> {
    bench.selectChord(chordId);
    await router.replace({ query: { ...route.query, chord: chordId } });
  }

  /** Back to the bench, which goes on where it stood. */
  async function leave(): Promise<void> {
    const { studyId } = route.params;
    const to = typeof studyId === 'string' ? { name: 'study', params: { studyId } } : { name: 'lab' };
    await router.push({ ...to, state: { stillOpen: true } });
  }

  return { study, bench, route, router, choose, leave };
}
