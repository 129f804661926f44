import { computed, ref } from 'vue';
import { useRouter } from 'vue-router';
import { roleMay } from '#shared/contracts/permissions';
import { ApiError } from '@/api/api-error';
import { newRequestKey } from '@/api/request-key';
import { notice } from '@/composables/notices';
import { useBenchStore } from '@/stores/bench.store';
import { useSessionStore } from '@/stores/session.store';
import { useStudyStore } from '@/stores/study.store';

/** What "keep this" means to whoever is here: save, make a study of the draft, copy, or sign up first. */
export function useStudyKeeping() {
  const session = useSessionStore();
  const study = useStudyStore();
  const bench = useBenchStore();
  const router = useRouter();
  const copyKey = ref(newRequestKey());

  const mayOwn = computed(() => roleMay(session.role, 'studies.own'));
  const label = computed(() => {
    if (study.maySave) return study.saveState === 'saved' ? null : 'Save';
    if (study.study) return mayOwn.value ? 'Keep a copy' : null;
    if (session.account && !mayOwn.value) return null;
    return bench.isEmpty ? null : 'Save';
  });

  async function show(studyId: string): Promise<void> {
    await router.replace({ name: 'study', params: { studyId }, state: { inPlace: true } });
  }

  async function keepDraft(): Promise<void> {
    if (!session.account) {
      await router.push({ name: 'sign-up', query: { next: '/' } });
      return;
    }
    const created = await study.saveDraft();
    if (created) await show(created.id);
  }

  async function keepCopy(): Promise<void> {
    try {
      const created = await study.copyAsOwn(bench.study.title, copyKey.value);
      copyKey.value = newRequestKey();
      notice('This copy is your own study: change it as you like.');
      await show(created.id);
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      notice(`The copy was not made. ${error.message}`);
    }
  }

  async function keep(): Promise<void> {
    if (label.value === null) return;
    if (study.maySave) return study.save();
    return study.study ? keepCopy() : keepDraft();
  }

  return { label, keep };
}
