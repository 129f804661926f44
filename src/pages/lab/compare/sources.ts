import { studiesSource } from '@/composables/studies-source';
import { progressionSource, type VoicingSource } from '@/composables/voicing-sources';
import { useBenchStore } from '@/stores/bench.store';
import { useSessionStore } from '@/stores/session.store';
import { useStudyStore } from '@/stores/study.store';

/** Where voicings to compare can be had from: another place is added to this list. */
export function useVoicingSources(): readonly VoicingSource[] {
  const bench = useBenchStore();
  const study = useStudyStore();
  const session = useSessionStore();
  const openId = (): string | null => study.study?.id ?? null;
  return [
    progressionSource(() => bench.study, openId),
    studiesSource(() => session.account !== null, openId),
  ];
}
