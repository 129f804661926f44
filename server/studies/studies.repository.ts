import { and, desc, eq, inArray, isNull, lt, ne, or, type SQL } from 'drizzle-orm';
import { alias, unionAll } from 'drizzle-orm/mysql-core';
import type { Study } from '#shared/contracts/studies';
import type { Connection, Transaction } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { saves } from '#server/db/schema/saves';
import { shares } from '#server/db/schema/shares';
import { studies } from '#server/db/schema/studies';
import type { Viewer } from '#server/http/bind';
import { readDocument } from '#server/studies/documents';
import { relationOf, seenBy, shareOf, unknownStudy } from '#server/studies/studies.access';

/** A study and who made its save; the routes tell the latter only where the contract says so. */
export type StudyWithSaver = Study & { readonly savedByName: string };

const saver = alias(accounts, 'saver');

function studyQuery(db: Connection, viewer: Viewer, which: SQL | undefined, number?: number) {
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

function toStudy(viewer: Viewer, row: Row): StudyWithSaver {
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

/** Where a page of the list begins: behind this study. */
export interface Position {
  readonly savedAt: Date;
  readonly id: string;
}

const POSITION = { id: studies.id, savedAt: studies.savedAt };
const NEWEST_FIRST = [desc(studies.savedAt), desc(studies.id)] as const;

function behind(after: Position | null): SQL | undefined {
  if (after === null) return undefined;
  const { savedAt, id } = after;
  return or(lt(studies.savedAt, savedAt), and(eq(studies.savedAt, savedAt), lt(studies.id, id)));
}

/** Each half reads no more than a page by its own index; a condition with `or` would read all. */
async function findPositions(db: Connection, viewer: Viewer, after: Position | null, limit: number) {
  const own = db
    .select(POSITION)
    .from(studies)
    .where(and(eq(studies.ownerId, viewer.id), isNull(studies.deletedAt), behind(after)))
    .orderBy(...NEWEST_FIRST)
    .limit(limit);
  const received = db
    .select(POSITION)
    .from(shares)
    .innerJoin(studies, eq(studies.id, shares.studyId))
    .where(
      and(
        eq(shares.email, viewer.email),
        ne(studies.ownerId, viewer.id),
        isNull(studies.deletedAt),
        behind(after),
      ),
    )
    .orderBy(...NEWEST_FIRST)
    .limit(limit);
  return unionAll(own, received)
    .orderBy(...NEWEST_FIRST)
    .limit(limit);
}

/** @returns own and received studies, newest first, and whether there are more behind them. */
export async function findStudies(
  db: Connection,
  viewer: Viewer,
  after: Position | null,
  limit: number,
): Promise<{ studies: Study[]; more: boolean }> {
  const positions = await findPositions(db, viewer, after, limit + 1);
  const ids = positions.slice(0, limit).map(({ id }) => id);
  if (ids.length === 0) return { studies: [], more: false };
  const rows = await studyQuery(db, viewer, inArray(studies.id, ids));
  const byId = new Map(rows.map((row) => [row.id, toStudy(viewer, row)]));
  return { studies: ids.flatMap((id) => byId.get(id) ?? []), more: positions.length > limit };
}

export async function insertStudy(
  tx: Transaction,
  study: { id: string; ownerId: string; requestKey: string; now: Date },
): Promise<void> {
  const { now, ...row } = study;
  await tx.insert(studies).values({ ...row, newestNumber: 1, savedAt: now, createdAt: now });
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
