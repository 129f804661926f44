import { queryClient } from '@/plugins/query';
import { useBenchStore } from '@/stores/bench.store';
import { forgetDraftRequestKey } from '@/stores/draft-request-key';
import { browserStorage, forgetSetAside } from '@/stores/draft-storage';
import { useSessionStore } from '@/stores/session.store';
import { forgetSignUp } from '@/stores/sign-up-memory';
import { useStudyStore } from '@/stores/study.store';

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
