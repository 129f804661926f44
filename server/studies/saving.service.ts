import { isDeepStrictEqual } from 'node:util';
import type { Merged, SavedStudy } from '#shared/contracts/studies';
import type { StudyDocument } from '#shared/study/study.document';
import type { Transaction } from '#server/db/connection';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { invalidInput, RequestError } from '#server/http/request-error';
import { mergeWithNewest } from '#server/studies/merging';
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

type SaveDeps = Pick<Deps, 'db' | 'clock' | 'summaries'>;

interface Placed extends SavePlace {
  /** What others had saved meanwhile, where it was merged with that. */
  readonly merged: Merged | null;
}

/** @throws RequestError when a key comes again with something else: it must not pass for done. */
export function checkSameRequest(kept: unknown, sent: unknown): void {
  if (isDeepStrictEqual(kept, sent)) return;
  throw new RequestError(409, 'request.reused', 'This request was made before with other content.');
}

async function accept(tx: Transaction, study: StudyAccess, save: NewSave): Promise<Placed> {
  const accepted = { kind: 'accepted', number: study.newestNumber + 1 } as const;
  await insertSave(tx, save, accepted);
  await noteNewest(tx, save, accepted.number);
  return { ...accepted, merged: save.merge?.told ?? null };
}

/** Gives the save its place: the next number, merged where it did not begin from the newest, or aside. */
async function place(tx: Transaction, study: StudyAccess, save: NewSave): Promise<Placed> {
  if (save.basedOn === study.newestNumber) return accept(tx, study, save);
  const merged = await mergeWithNewest(tx, save, study.newestNumber);
  if (merged !== null) return accept(tx, study, merged);
  const aside = { kind: 'set-aside', number: study.setAsideCount + 1 } as const;
  await insertSave(tx, save, aside);
  await noteSetAside(tx, study.id, aside.number);
  return { ...aside, merged: null };
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
  readonly deviceKey?: string | undefined;
}

/**
 * Keeps a change of a study under a lock of it, once for each request key.
 * @param make the document to keep.
 * @throws RequestError 409 `study.stale` when it cannot be merged with what was saved since; it is kept aside.
 */
async function change(
  deps: SaveDeps,
  viewer: Viewer,
  studyId: string,
  { basedOn, requestKey, deviceKey }: Change,
  make: (tx: Transaction) => Promise<StudyDocument>,
): Promise<SavedStudy> {
  const { db, clock } = deps;
  const placed = await inTransaction(db, async (tx): Promise<Placed> => {
    const study = await lockStudy(tx, viewer, studyId, 'save');
    checkBase(study, basedOn);
    const document = await make(tx);
    const earlier = await findSaveByKey(tx, studyId, viewer.id, requestKey);
    if (earlier !== null) {
      checkSameRequest(earlier.merge?.sent ?? earlier.document, document);
      return { ...earlier, merged: earlier.merge?.told ?? null };
    }
    const save = { studyId, basedOn, document, savedBy: viewer.id, savedAt: clock(), requestKey, deviceKey };
    return place(tx, study, save);
  });
  if (placed.kind === 'set-aside') throw await stale(deps, viewer, studyId, placed);
  deps.summaries.kick();
  return { ...(await findStudy(db, viewer, studyId, placed.number)), merged: placed.merged };
}

export function saveDocument(
  deps: SaveDeps,
  viewer: Viewer,
  studyId: string,
  body: Change & { readonly document: StudyDocument },
): Promise<SavedStudy> {
  return change(deps, viewer, studyId, body, async () => body.document);
}

/** A new title is a save like any other: of what it began from, under the new title. */
export function rename(
  deps: SaveDeps,
  viewer: Viewer,
  studyId: string,
  body: Change & { readonly title: string },
): Promise<SavedStudy> {
  return change(deps, viewer, studyId, body, async (tx) => {
    const document = await findAcceptedDocument(tx, studyId, body.basedOn);
    if (document === null) throw invalidInput([{ path: 'body.basedOn', message: 'that save is not kept' }]);
    return { ...document, title: body.title };
  });
}
