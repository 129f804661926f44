import { and, eq, isNotNull, isNull, or, type SQL } from 'drizzle-orm';
import { mayDoToStudy, type Relation, type StudyAction } from '#shared/contracts/permissions';
import type { Connection, Transaction } from '#server/db/connection';
import { shares } from '#server/db/schema/shares';
import { studies } from '#server/db/schema/studies';
import type { Viewer } from '#server/http/bind';
import { notAllowed, RequestError } from '#server/http/request-error';

export function unknownStudy(): RequestError {
  return new RequestError(404, 'study.unknown', 'There is no such study, or it is not shared with you.');
}

/** Joins the share that a study was opened to the viewer by, if any. */
export function shareOf(viewer: Viewer): SQL | undefined {
  return and(eq(shares.studyId, studies.id), eq(shares.email, viewer.email));
}

/** Every query of a study carries it; with {@link shareOf} joined. A deleted study is its owner's alone. */
export function seenBy(viewer: Viewer): SQL | undefined {
  return or(eq(studies.ownerId, viewer.id), and(isNotNull(shares.id), isNull(studies.deletedAt)));
}

interface Standing {
  readonly ownerId: string;
  readonly may: 'view' | 'comment' | null;
}

export function relationOf(viewer: Viewer, { ownerId, may }: Standing): Relation {
  return ownerId === viewer.id ? 'owner' : (may ?? 'stranger');
}

export interface StudyAccess {
  readonly id: string;
  readonly relation: Relation;
  readonly newestNumber: number;
  readonly setAsideCount: number;
  readonly deletedAt: Date | null;
}

function accessQuery(db: Connection, viewer: Viewer, studyId: string) {
  return db
    .select({
      id: studies.id,
      ownerId: studies.ownerId,
      may: shares.may,
      newestNumber: studies.newestNumber,
      setAsideCount: studies.setAsideCount,
      deletedAt: studies.deletedAt,
    })
    .from(studies)
    .leftJoin(shares, shareOf(viewer))
    .where(and(eq(studies.id, studyId), seenBy(viewer)));
}

type Row = Standing & Omit<StudyAccess, 'relation'>;

function permit(viewer: Viewer, row: Row | undefined, action: StudyAction): StudyAccess {
  const relation = row === undefined ? 'stranger' : relationOf(viewer, row);
  if (row === undefined || !mayDoToStudy(relation, 'read')) throw unknownStudy();
  if (!mayDoToStudy(relation, action)) throw notAllowed();
  return { ...row, relation };
}

function alive(access: StudyAccess): StudyAccess {
  if (access.deletedAt !== null) throw unknownStudy();
  return access;
}

/**
 * @returns how the viewer stands to a study, when they may do this to it.
 * @throws RequestError 404 when they may not even read it, 403 when they may not do this.
 */
export async function accessStudy(
  db: Connection,
  viewer: Viewer,
  studyId: string,
  action: StudyAction,
): Promise<StudyAccess> {
  const [row] = await accessQuery(db, viewer, studyId);
  return alive(permit(viewer, row, action));
}

/** Like {@link accessStudy}, and nobody else changes the study until the transaction ends. */
export async function lockStudy(
  tx: Transaction,
  viewer: Viewer,
  studyId: string,
  action: StudyAction,
): Promise<StudyAccess> {
  const [row] = await accessQuery(tx, viewer, studyId).for('update');
  return alive(permit(viewer, row, action));
}

/** Like {@link lockStudy}, for a study that may be in the trash. */
export async function lockTrash(
  tx: Transaction,
  viewer: Viewer,
  studyId: string,
  action: StudyAction,
): Promise<StudyAccess> {
  const [row] = await accessQuery(tx, viewer, studyId).for('update');
  return permit(viewer, row, action);
}
