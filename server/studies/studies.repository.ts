import { and, eq, isNull, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { Study } from '#shared/contracts/studies';
import type { StudyDocument } from '#shared/study/study.document';
import type { Connection, Transaction } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { saves } from '#server/db/schema/saves';
import { shares } from '#server/db/schema/shares';
import { studies } from '#server/db/schema/studies';
import type { Viewer } from '#server/http/bind';
import { columnsOf, readDocument } from '#server/studies/documents';
import { relationOf, seenBy, shareOf, unknownStudy } from '#server/studies/studies.access';

/** A study and who made its save; the routes tell the latter only where the contract says so. */
export type StudyWithSaver = Study & { readonly savedByName: string };

const saver = alias(accounts, 'saver');

/** Studies as the viewer may see them, at their newest save or another. */
export function studyQuery(db: Connection, viewer: Viewer, which: SQL | undefined, number?: number) {
  return db
    .select({
      id: studies.id,
      number: saves.number,
      document: saves.document,
      ownerId: studies.ownerId,
      may: shares.may,
      ownerName: accounts.name,
      savedByName: saver.name,
      savedAt: saves.savedAt,
    })
    .from(studies)
    .innerJoin(
      saves,
      and(
        eq(saves.studyId, studies.id),
        eq(saves.kind, 'accepted'),
        eq(saves.number, number ?? studies.newestNumber),
      ),
    )
    .innerJoin(accounts, eq(accounts.id, studies.ownerId))
    .innerJoin(saver, eq(saver.id, saves.savedBy))
    .leftJoin(shares, shareOf(viewer))
    .where(and(which, isNull(studies.deletedAt), seenBy(viewer)));
}

type Row = Awaited<ReturnType<typeof studyQuery>>[number];

export function toStudy(viewer: Viewer, row: Row): StudyWithSaver {
  const relation = relationOf(viewer, row);
  if (relation === 'stranger') throw unknownStudy();
  const { id, number, ownerName, savedByName } = row;
  const document = readDocument(row.document);
  return { id, number, document, relation, ownerName, savedByName, savedAt: row.savedAt.toISOString() };
}

/** @param number of the save to read; without it the newest. */
export async function findStudy(
  db: Connection,
  viewer: Viewer,
  studyId: string,
  number?: number,
): Promise<StudyWithSaver> {
  const [row] = await studyQuery(db, viewer, eq(studies.id, studyId), number);
  if (row === undefined) throw unknownStudy();
  return toStudy(viewer, row);
}

export async function insertStudy(
  tx: Transaction,
  study: { id: string; ownerId: string; requestKey: string; now: Date; document: StudyDocument },
): Promise<void> {
  const { now, document, ...row } = study;
  const columns = { newestNumber: 1, savedAt: now, createdAt: now, ...columnsOf(document) };
  await tx.insert(studies).values({ ...row, ...columns });
}

export async function findStudyIdByKey(
  db: Connection,
  ownerId: string,
  requestKey: string,
): Promise<string | null> {
  const [row] = await db
    .select({ id: studies.id })
    .from(studies)
    .where(and(eq(studies.ownerId, ownerId), eq(studies.requestKey, requestKey)));
  return row?.id ?? null;
}

export async function setDeleted(db: Connection, studyId: string, deletedAt: Date | null): Promise<void> {
  await db.update(studies).set({ deletedAt }).where(eq(studies.id, studyId));
}
