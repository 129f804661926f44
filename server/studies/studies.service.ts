import type { Study } from '#shared/contracts/studies';
import type { StudyDocument } from '#shared/study/study.document';
import { randomSecret } from '#server/accounts/secrets';
import type { Transaction } from '#server/db/connection';
import { insertOnce } from '#server/db/insert-once';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { invalidInput } from '#server/http/request-error';
import { findAcceptedDocument, insertSave } from '#server/studies/saves.repository';
import { checkSameRequest } from '#server/studies/saving.service';
import { findStudies, type Position } from '#server/studies/studies.listing';
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
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
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
  return findStudy(db, viewer, id, 1);
}

const POSITION = /^(\d{1,15})\.([A-Za-z0-9_-]{16,36})$/;

function writePosition(study: Study): string {
  return `${Date.parse(study.savedAt)}.${study.id}`;
}

function readPosition(after: string | undefined): Position | null {
  if (after === undefined) return null;
  const [, milliseconds, id] = POSITION.exec(after) ?? [];
  if (milliseconds === undefined || id === undefined) {
    throw invalidInput([{ path: 'query.after', message: 'this is no place in the list' }]);
  }
  return { savedAt: new Date(Number(milliseconds)), id };
}

export async function listPage(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  query: { readonly after?: string | undefined; readonly limit: number },
): Promise<{ studies: Study[]; next: string | null }> {
  const { studies, more } = await findStudies(db, viewer, readPosition(query.after), query.limit);
  const last = studies.at(-1);
  return { studies, next: more && last !== undefined ? writePosition(last) : null };
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
