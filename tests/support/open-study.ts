import { createPinia, setActivePinia } from 'pinia';
import type { Account } from '#shared/contracts/accounts';
import type { Merged, SavedStudy, StaleDetails, Study } from '#shared/contracts/studies';
import { newStudy, newVoice } from '#shared/study/new-study';
import { studyDocumentSchema, type StudyDocument } from '#shared/study/study.document';
import { changeChord } from '#shared/study/study.changes';
import { useBenchStore } from '@/stores/bench.store';
import { useSessionStore } from '@/stores/session.store';
import { useStudyStore } from '@/stores/study.store';

export const STUDY_ID = 'study-0123456789abcdef';
export const ADA: Account = {
  id: 'account-ada',
  name: 'Ada Fenn',
  email: 'ada@river.example',
  role: 'composer',
};

/** A study of one chord with the notes given, all to the cellos. */
export function documentOf(...pitches: string[]): StudyDocument {
  const study = newStudy('chord-one');
  const voices = pitches.map((pitch, index) => newVoice(`voice-${index}`, 'cello', pitch));
  return studyDocumentSchema.parse(changeChord(study, 'chord-one', (chord) => ({ ...chord, voices })));
}

export function studyOf(document: StudyDocument, number = 1, relation: Study['relation'] = 'owner'): Study {
  const savedAt = '2026-03-01T10:00:00.000Z';
  return { id: STUDY_ID, number, document, relation, ownerName: 'Ada Fenn', savedAt };
}

export function staleOf(document: StudyDocument, number: number): StaleDetails {
  return { newest: { ...studyOf(document, number), savedByName: 'Ada Fenn' }, setAsideNumber: 1 };
}

/** The stores as they stand for somebody who is signed in. */
export function atTheDesk(account: Account | null = ADA) {
  setActivePinia(createPinia());
  const session = useSessionStore();
  session.account = account;
  session.status = 'ready';
  const bench = useBenchStore();
  const study = useStudyStore();
  const put = (...pitches: string[]) =>
    bench.change({ ...bench.study, chords: documentOf(...pitches).chords });
  return { session, bench, study, put };
}

/** The answer to a save. */
export function savedOf(document: StudyDocument, number: number, merged: Merged | null = null): SavedStudy {
  return { ...studyOf(document, number), merged };
}
