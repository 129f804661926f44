import type { DraftDocument } from '#shared/study/draft';
import { queryClient } from '@/plugins/query';
import { useBenchStore } from '@/stores/bench.store';
import { forgetDraftRequestKey } from '@/stores/draft-request-key';
import { browserStorage, forgetSetAside } from '@/stores/draft-storage';
import { allWork } from '@/stores/kept-work';
import { useSessionStore } from '@/stores/session.store';
import { forgetSignUp } from '@/stores/sign-up-memory';
import { useStudyStore } from '@/stores/study.store';
import { workStorage } from '@/stores/work-storage';

/**
 * Takes away what whoever was signed in left in this browser: their open study, unsaved work, draft and
 * everything that was fetched for them. Whoever comes next sees nothing of it.
 */
export function forgetPerson(): void {
  const bench = useBenchStore();
  const storage = browserStorage();
  useSessionStore().forget();
  useStudyStore().forget();
  bench.clearDraft();
  bench.openDraft();
  forgetSetAside(storage);
  forgetDraftRequestKey(storage);
  forgetSignUp(storage);
  queryClient.clear();
}

/**
 * What would be lost by leaving: the open study or the draft where it is not saved, and whatever else this
 * browser keeps unsaved of whoever is signed in.
 */
export function unsavedWork(): readonly DraftDocument[] {
  const [bench, study, session] = [useBenchStore(), useStudyStore(), useSessionStore()];
  const onTheBench = study.hasUnsaved || (bench.holdsDraft && !bench.isEmpty) ? [bench.study] : [];
  const kept = session.account ? allWork(workStorage(), session.account.id) : new Map();
  const elsewhere = [...kept].filter(([studyId]) => studyId !== study.study?.id);
  return [...onTheBench, ...elsewhere.map(([, work]) => work.document)];
}
