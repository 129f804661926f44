import { shelfSource } from '@/composables/shelf-source';
import { studiesSource } from '@/composables/studies-source';
import { versionsSource } from '@/composables/versions-source';
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
    versionsSource(() => (study.maySave ? openId() : null)),
    studiesSource(() => session.account !== null, openId),
    shelfSource(() => session.account !== null),
  ];
}
