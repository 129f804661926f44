import { isDeepStrictEqual } from 'node:util';
import type { Study } from '#shared/contracts/studies';
import type { StudyDocument } from '#shared/study/study.document';
import type { Transaction } from '#server/db/connection';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { invalidInput, RequestError } from '#server/http/request-error';
import {
  findAcceptedDocument,
  findSaveByKey,
  insertSave,
  noteNewest,
  noteSetAside,
  type NewSave,
  type SavePlace,
} from '#server/studies/saves.repository';
import { lockStudy, type StudyAccess } from '#server/studies/studies.access';
import { findStudy } from '#server/studies/studies.repository';

type SaveDeps = Pick<Deps, 'db' | 'clock'>;

/** @throws RequestError when a key comes again with something else: it must not pass for done. */
export function checkSameRequest(kept: unknown, sent: unknown): void {
  if (isDeepStrictEqual(kept, sent)) return;
  throw new RequestError(409, 'request.reused', 'This request was made before with other content.');
}

/** Gives the save its place: the next number when it began from the newest, else aside, with nothing lost. */
async function place(tx: Transaction, study: StudyAccess, save: NewSave): Promise<SavePlace> {
  if (save.basedOn === study.newestNumber) {
    const accepted = { kind: 'accepted', number: study.newestNumber + 1 } as const;
    await insertSave(tx, save, accepted);
    await noteNewest(tx, study.id, accepted.number, save.savedAt);
    return accepted;
  }
  const aside = { kind: 'set-aside', number: study.setAsideCount + 1 } as const;
  await insertSave(tx, save, aside);
  await noteSetAside(tx, study.id, aside.number);
  return aside;
}

function checkBase(study: StudyAccess, basedOn: number): void {
  if (basedOn <= study.newestNumber) return;
  throw invalidInput([{ path: 'body.basedOn', message: 'this study has no save of that number yet' }]);
}

async function stale(
  deps: SaveDeps,
  viewer: Viewer,
  studyId: string,
  aside: SavePlace,
): Promise<RequestError> {
  const newest = await findStudy(deps.db, viewer, studyId);
  return new RequestError(
    409,
    'study.stale',
    'This study was saved elsewhere meanwhile. Your version is kept beside the newest one: choose between them.',
    { details: { newest, setAsideNumber: aside.number } },
  );
}

interface Change {
  readonly basedOn: number;
  readonly requestKey: string;
}

/**
 * Keeps a change of a study under a lock of it, once for each request key.
 * @param make the document to keep.
 * @throws RequestError 409 `study.stale` when the study moved on; the document is kept aside.
 */
async function change(
  deps: SaveDeps,
  viewer: Viewer,
  studyId: string,
  { basedOn, requestKey }: Change,
  make: (tx: Transaction) => Promise<StudyDocument>,
): Promise<Study> {
  const { db, clock } = deps;
  const placed = await inTransaction(db, async (tx): Promise<SavePlace> => {
    const study = await lockStudy(tx, viewer, studyId, 'save');
    checkBase(study, basedOn);
    const document = await make(tx);
    const earlier = await findSaveByKey(tx, studyId, viewer.id, requestKey);
    if (earlier !== null) {
      checkSameRequest(earlier.document, document);
      return earlier;
    }
    return place(tx, study, { studyId, basedOn, document, savedBy: viewer.id, savedAt: clock(), requestKey });
  });
  if (placed.kind === 'set-aside') throw await stale(deps, viewer, studyId, placed);
  return findStudy(db, viewer, studyId, placed.number);
}

export function saveDocument(
  deps: SaveDeps,
  viewer: Viewer,
  studyId: string,
  body: Change & { readonly document: StudyDocument },
): Promise<Study> {
  return change(deps, viewer, studyId, body, async () => body.document);
}

/** A new title is a save like any other: of what it began from, under the new title. */
export function rename(
  deps: SaveDeps,
  viewer: Viewer,
  studyId: string,
  body: Change & { readonly title: string },
): Promise<Study> {
  return change(deps, viewer, studyId, body, async (tx) => {
    const document = await findAcceptedDocument(tx, studyId, body.basedOn);
    if (document === null) throw invalidInput([{ path: 'body.basedOn', message: 'that save is not kept' }]);
    return { ...document, title: body.title };
  });
}
