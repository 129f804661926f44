import type { Study } from '#shared/contracts/studies';
import { shortened } from '#shared/study/shortened';
import { MAX_TITLE, type StudyDocument } from '#shared/study/study.document';
import { randomSecret } from '#server/accounts/secrets';
import type { Transaction } from '#server/db/connection';
import { insertOnce } from '#server/db/insert-once';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { findAcceptedDocument, insertSave } from '#server/studies/saves.repository';
import { checkSameRequest } from '#server/studies/saving.service';
import { lockTrash, unknownStudy } from '#server/studies/studies.access';
import { findStudy, findStudyIdByKey, insertStudy, setDeleted } from '#server/studies/studies.repository';

interface NewStudy {
  readonly document: StudyDocument;
  readonly requestKey: string;
}

/** The same request came before: what it made is the answer again. */
async function findMade(
  tx: Transaction,
  viewer: Viewer,
  { document, requestKey }: NewStudy,
): Promise<string> {
  const id = await findStudyIdByKey(tx, viewer.id, requestKey);
  if (id === null) throw unknownStudy();
  checkSameRequest(await findAcceptedDocument(tx, id, 1), document);
  return id;
}

export async function makeStudy(
  { db, clock, summaries }: Pick<Deps, 'db' | 'clock' | 'summaries'>,
  viewer: Viewer,
  study: NewStudy,
): Promise<Study> {
  const { document, requestKey } = study;
  const id = await inTransaction(db, async (tx) => {
    const now = clock();
    const made = randomSecret();
    const row = { id: made, ownerId: viewer.id, requestKey, now, document };
    if (!(await insertOnce(() => insertStudy(tx, row)))) return findMade(tx, viewer, study);
    const save = { studyId: made, basedOn: 0, document, savedBy: viewer.id, savedAt: now, requestKey };
    await insertSave(tx, save, { kind: 'accepted', number: 1 });
    return made;
  });
  summaries.kick();
  return findStudy(db, viewer, id, 1);
}

const COPY = ' (copy)';

/** Makes a study of the viewer's own like one that they may read; asked again, it is still one. */
export async function duplicate(
  deps: Pick<Deps, 'db' | 'clock' | 'summaries'>,
  viewer: Viewer,
  studyId: string,
  requestKey: string,
): Promise<Study> {
  const { document } = await findStudy(deps.db, viewer, studyId);
  const made = await findStudyIdByKey(deps.db, viewer.id, requestKey);
  if (made !== null) return findStudy(deps.db, viewer, made, 1);
  return makeStudy(deps, viewer, {
    document: { ...document, title: shortened(document.title, MAX_TITLE - COPY.length) + COPY },
    requestKey,
  });
}

/** Deleting twice is the same as once. */
export async function trash(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  viewer: Viewer,
  studyId: string,
): Promise<void> {
  await inTransaction(db, async (tx) => {
    const access = await lockTrash(tx, viewer, studyId, 'delete');
    if (access.deletedAt === null) await setDeleted(tx, studyId, clock());
  });
}

export async function restore({ db }: Pick<Deps, 'db'>, viewer: Viewer, studyId: string): Promise<Study> {
  return inTransaction(db, async (tx) => {
    await lockTrash(tx, viewer, studyId, 'delete');
    await setDeleted(tx, studyId, null);
    return findStudy(tx, viewer, studyId);
  });
}
