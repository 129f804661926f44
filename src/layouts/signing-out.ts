import { onMounted, ref, shallowRef } from 'vue';

import { useRouter } from 'vue-router';
import type { DraftDocument } from '#shared/study/draft';
import { onSessionEnded } from '@/api/call';
import { forgetCsrfToken } from '@/api/csrf';
import { notice } from '@/composables/notices';
import { forgetPerson, unsavedWork } from '@/stores/leaving';
import { sessionChannel } from '@/stores/session-channel';
import { useSessionStore } from '@/stores/session.store';
import { useStudyStore } from '@/stores/study.store';

/** Coming and going: leaves nothing behind, tells the other tabs, and asks first where work would be lost. */
export function useSigningOut() {
  const session = useSessionStore();
  const study = useStudyStore();
  const router = useRouter();
  const channel = sessionChannel();
  const asking = ref(false);
  const leaving = ref(false);
  const works = shallowRef<readonly DraftDocument[]>([]);

  async function leave(): Promise<void> {
    asking.value = false;
    leaving.value = true;
    await session.signOut().finally(() => (leaving.value = false));
    channel.tell('signed-out');
    await gone();
  }

  async function gone(): Promise<void> {
    forgetPerson();
    await router.push({ name: 'lab' });
  }

  /** Somebody signed in in another tab: if it is somebody else, nothing of the first one stays here. */
  async function arrived(): Promise<void> {
    const before = session.account?.id;
    await session.reload();
    if (before === undefined || session.account?.id === before) return;
    forgetPerson();
    await session.reload();
    await router.push({ name: 'lab' });
  }

  async function signOut(): Promise<void> {
    if (study.hasUnsaved) await study.save();
    works.value = unsavedWork();
    if (works.value.length > 0) asking.value = true;
    else await leave();
  }

  onMounted(() => {
    onSessionEnded(() => {
      if (session.account)
        notice('Your session has ended. What you did is kept in this browser: sign in to go on.');
      session.forget();
    });
    channel.listen((message) => {
      forgetCsrfToken();
      if (message === 'signed-out') void gone();
      else void arrived();
    });
  });

  return { asking, works, leaving, signOut, leave };
}
