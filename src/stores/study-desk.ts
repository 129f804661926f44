import { computed, ref, shallowRef } from 'vue';
import type { BodyOf } from '#shared/contracts/endpoint';
import { mayDoToStudy } from '#shared/contracts/permissions';
import type { Merged, saveStudy, StaleDetails, Study } from '#shared/contracts/studies';
import type { LoadStatus } from '@/api/load-status';
import { useBenchStore } from '@/stores/bench.store';
import { browserStorage } from '@/stores/draft-storage';
import type { SaveFailure } from '@/stores/save-failure';
import { useSessionStore } from '@/stores/session.store';
import { workStorage } from '@/stores/work-storage';

export type SaveState = 'saved' | 'unsaved' | 'saving' | 'offline' | 'failed' | 'conflict';

/** One intended change on its way, with the bench's revision that it holds. */
export interface Sending {
  readonly body: BodyOf<typeof saveStudy>;
  /** `null` for one that an earlier visit sent: the bench has moved on since. */
  readonly revision: number | null;
}

/** The study that lies open, and how its saving stands. */
export function useStudyDesk() {
  const bench = useBenchStore();
  const study = shallowRef<Study | null>(null);
  const status = ref<LoadStatus>('idle');
  /** Whose desk it is: still theirs when their session has ended. */
  const accountId = ref<string | null>(null);
  /** Why a study could not be opened. */
  const problem = ref<string | null>(null);
  /** What was asked for last: an answer that comes late opens nothing. */
  const wantedId = ref<string | null>(null);
  /** The number of the save from which the work on the bench began. */
  const basedOn = ref(0);
  const sending = shallowRef<Sending | null>(null);
  const inFlight = ref(false);
  const failure = shallowRef<Exclude<SaveFailure, { kind: 'stale' }> | null>(null);
  const failures = ref(0);
  const conflict = shallowRef<StaleDetails | null>(null);
  /** What others had saved meanwhile, where the last save was merged with it. */
  const merged = shallowRef<Merged | null>(null);
  /** Why the bench cannot be saved as it stands. */
  const unfinished = ref<string | null>(null);
  /** Whether the browser took the last change, as far as it has said. */
  const taken = ref(true);
  const works = workStorage();
  const keptInBrowser = computed(() => taken.value && !works.failed.value);

  const maySave = computed(() => study.value !== null && mayDoToStudy(study.value.relation, 'save'));
  const hasUnsaved = computed(() => maySave.value && (bench.dirty || sending.value !== null));
  const saveState = computed<SaveState>(() => {
    if (conflict.value) return 'conflict';
    if (failure.value) return failure.value.kind === 'passing' ? 'offline' : 'failed';
    if (inFlight.value) return 'saving';
    return hasUnsaved.value ? 'unsaved' : 'saved';
  });
  const saveProblem = computed(() => failure.value?.message ?? unfinished.value);

  const around = { bench, session: useSessionStore(), storage: browserStorage(), works };
  const opening = { accountId, study, status, problem, wantedId, basedOn };
  const saving = { sending, inFlight, failure, failures, conflict, merged, unfinished, taken, keptInBrowser };
  return { ...around, ...opening, ...saving, maySave, hasUnsaved, saveState, saveProblem };
}
export type StudyDesk = ReturnType<typeof useStudyDesk>;

/** Lays a study on the desk with nothing on its way. */
export function layOut(desk: StudyDesk, study: Study | null): void {
  desk.study.value = study;
  desk.accountId.value = desk.session.account?.id ?? desk.accountId.value;
  desk.basedOn.value = study?.number ?? 0;
  desk.sending.value = null;
  desk.failure.value = null;
  desk.failures.value = 0;
  desk.conflict.value = null;
  desk.merged.value = null;
  desk.unfinished.value = null;
  desk.bench.readOnly = study !== null && !desk.maySave.value;
}
