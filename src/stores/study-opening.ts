import type { Study } from '#shared/contracts/studies';
import { sameStudy } from '#shared/study/study.differences';
import { studyDocumentSchema } from '#shared/study/study.document';
import { ApiError } from '@/api/api-error';
import { createStudy, readStudy } from '@/api/studies';
import { draftRequestKey, forgetDraftRequestKey } from '@/stores/draft-request-key';
import { forgetWork, readUnreadable, readWork } from '@/stores/kept-work';
import { layOut, type StudyDesk } from '@/stores/study-desk';
import { finishedDocument, flush, settle } from '@/stores/study-saving';

/** Puts back what this person left unsaved here, on top of the study as the server has it. */
function takeUpWork(desk: StudyDesk, opened: Study): void {
  const accountId = desk.accountId.value ?? '';
  const unreadable = readUnreadable(desk.works, opened.id, accountId);
  if (unreadable !== null) {
    desk.bench.putAside(unreadable);
    forgetWork(desk.works, opened.id);
  }
  const work = desk.maySave.value ? readWork(desk.works, opened.id, accountId) : null;
  if (!work) return;
  if (sameStudy(work.document, opened.document)) {
    forgetWork(desk.works, opened.id);
    return;
  }
  desk.basedOn.value = work.basedOn;
  desk.sending.value = work.pending && { body: work.pending, revision: null };
  desk.bench.change(work.document);
}

/** Lays a study on the bench, with the work on it that this browser still keeps. */
function show(desk: StudyDesk, opened: Study): void {
  desk.bench.leaveDraft();
  desk.bench.readOnly = false;
  layOut(desk, opened);
  desk.bench.replaceDocument(opened.document);
  takeUpWork(desk, opened);
}

/** Opens a study; what was open before is saved on the way. */
export async function open(desk: StudyDesk, studyId: string): Promise<void> {
  desk.wantedId.value = studyId;
  desk.status.value = 'loading';
  desk.problem.value = null;
  await settle(desk);
  // Where the server was away when the page began, it is not known yet whose desk this is.
  await desk.session.load();
  await desk.works.refresh();
  if (desk.wantedId.value !== studyId) return;
  layOut(desk, null);
  try {
    const opened = await readStudy(studyId);
    if (desk.wantedId.value !== studyId) return;
    show(desk, opened);
    desk.status.value = 'ready';
    await flush(desk);
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    if (desk.wantedId.value !== studyId) return;
    desk.problem.value = error.message;
    desk.status.value = 'error';
  }
}

/** Goes to the draft that the browser keeps; what was open before is saved on the way. */
export function openDraft(desk: StudyDesk): void {
  void flush(desk);
  desk.wantedId.value = null;
  layOut(desk, null);
  desk.status.value = 'idle';
  desk.problem.value = null;
  desk.bench.openDraft();
}

/**
 * Makes the draft a study of the person who is signed in, and goes on with it where it lies.
 * @returns nothing where that is not possible yet; the desk says why, and the draft stays as it is
 */
export async function saveDraft(desk: StudyDesk): Promise<Study | null> {
  const revision = desk.bench.revision;
  const document = finishedDocument(desk);
  if (!document || desk.inFlight.value) return null;
  desk.inFlight.value = true;
  const created = await createStudy({ document, requestKey: draftRequestKey(desk.storage) })
    .catch((error: unknown) => draftNotTaken(desk, error))
    .finally(() => (desk.inFlight.value = false));
  if (!created) return null;
  forgetDraftRequestKey(desk.storage);
  desk.bench.leaveDraft();
  desk.bench.clearDraft();
  layOut(desk, created);
  desk.status.value = 'ready';
  if (sameStudy(created.document, document)) desk.bench.markSaved(revision);
  else putOnTop(desk, created);
  await flush(desk);
  return created;
}

/** An earlier try was taken with what the draft was then: what is on the bench now follows as a save. */
function putOnTop(desk: StudyDesk, created: Study): void {
  const present = desk.bench.study;
  desk.bench.replaceDocument(created.document);
  desk.bench.change(present);
}

function draftNotTaken(desk: StudyDesk, error: unknown): null {
  if (!(error instanceof ApiError)) throw error;
  const message = `${error.message} Your draft is kept in this browser: save it again in a while.`;
  desk.failure.value = { kind: 'refused', message };
  return null;
}

/** Makes a study of one's own from the one in view. */
export async function copyAsOwn(desk: StudyDesk, title: string, requestKey: string): Promise<Study> {
  const document = studyDocumentSchema.parse({ ...desk.bench.study, title });
  const created = await createStudy({ document, requestKey });
  show(desk, created);
  desk.status.value = 'ready';
  return created;
}
