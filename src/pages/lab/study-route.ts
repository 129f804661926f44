import { useEventListener } from '@vueuse/core';
import { watch, watchEffect } from 'vue';
import { useRoute } from 'vue-router';
import { setTabTitle } from '@/composables/tab-title';
import { useBenchStore } from '@/stores/bench.store';
import { useStudyStore } from '@/stores/study.store';

/** The projector and the page for print leave the study open for the bench to go on with. */
function isStillOpen(): boolean {
  const state: unknown = history.state;
  return typeof state === 'object' && state !== null && 'stillOpen' in state && state.stillOpen === true;
}

/** Opens what the address names, names the browser's tab after it, and warns before work is lost. */
export function useStudyRoute(): void {
  const route = useRoute();
  const study = useStudyStore();
  const bench = useBenchStore();

  watch(
    () => [route.name, route.params.studyId] as const,
    ([name, studyId], before) => {
      const draftLiesOpen = bench.holdsDraft && !study.study;
      if (name === 'lab' && !draftLiesOpen) study.openDraft();
      if (name !== 'study' || typeof studyId !== 'string') return;
      // A draft that has just become this study lies open already.
      const hasBecomeThis = (before?.[0] !== undefined || isStillOpen()) && study.study?.id === studyId;
      if (!hasBecomeThis) void study.open(studyId);
    },
    { immediate: true },
  );
  watchEffect(() => {
    if (study.study && route.name === 'study') setTabTitle(bench.study.title);
  });
  useEventListener(window, 'beforeunload', (event) => {
    if (study.hasUnsaved && !study.keptInBrowser) event.preventDefault();
  });
}
