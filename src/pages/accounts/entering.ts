import { useRoute, useRouter } from 'vue-router';
import type { Account } from '#shared/contracts/accounts';
import { notice } from '@/composables/notices';
import { nextPath } from '@/router/next';
import { adoptDraft } from '@/stores/draft-adoption';
import { sessionChannel } from '@/stores/session-channel';
import { useSessionStore } from '@/stores/session.store';
import { useStudyStore } from '@/stores/study.store';

/** Signs in, by address or by the link that confirms it, and goes on: to the study that the draft became, to where one was sent from, or to the studies. */
export function useEntering() {
  const session = useSessionStore();
  const router = useRouter();
  const route = useRoute();

  async function goOn(account: Account): Promise<void> {
    useStudyStore().clearFor(account.id);
    sessionChannel().tell('signed-in');
    const adopted = await adoptDraft(account);
    if (adopted.kind === 'adopted') {
      notice(`Your draft is saved as your study “${adopted.study.document.title}”.`);
      await router.push({ name: 'study', params: { studyId: adopted.study.id } });
      return;
    }
    if (adopted.kind === 'kept')
      notice(`Your draft could not be saved yet. It is kept in the Lab: save it there.`);
    await router.push(nextPath(route.query.next, location.origin) ?? { name: 'lab' });
  }

  const enter = async (email: string, password: string) => goOn(await session.signIn(email, password));
  const confirm = async (token: string, password: string) => goOn(await session.confirm(token, password));

  return { enter, confirm };
}
