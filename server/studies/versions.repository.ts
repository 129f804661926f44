import { and, desc, eq, isNotNull, lt, sql } from 'drizzle-orm';
import type { StudyDocument } from '#shared/study/study.document';
import type { Connection } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { saves, type SaveKind } from '#server/db/schema/saves';
import { readDocument } from '#server/studies/documents';

const MARK = {
  number: saves.number,
  basedOn: saves.basedOn,
  savedAt: saves.savedAt,
  savedBy: saves.savedBy,
  savedByName: accounts.name,
  deviceKey: saves.deviceKey,
  name: saves.name,
  merged: sql<boolean>`${isNotNull(saves.merge)}`.mapWith(Boolean),
};

function ofStudy(studyId: string, kind: SaveKind) {
  return and(eq(saves.studyId, studyId), eq(saves.kind, kind));
}

/** @returns what is known of saves besides their documents, the newest first */
export async function findMarks(
  db: Connection,
  studyId: string,
  kind: SaveKind,
  before: number | null,
  limit: number,
) {
  return db
    .select(MARK)
    .from(saves)
    .innerJoin(accounts, eq(accounts.id, saves.savedBy))
    .where(and(ofStudy(studyId, kind), before === null ? undefined : lt(saves.number, before)))
    .orderBy(desc(saves.number))
    .limit(limit);
}
export type Mark = Awaited<ReturnType<typeof findMarks>>[number];

export async function findVersion(
  db: Connection,
  studyId: string,
  kind: SaveKind,
  number: number,
): Promise<(Mark & { readonly document: StudyDocument }) | null> {
  const [row] = await db
    .select({ ...MARK, document: saves.document })
    .from(saves)
    .innerJoin(accounts, eq(accounts.id, saves.savedBy))
    .where(and(ofStudy(studyId, kind), eq(saves.number, number)));
  return row === undefined ? null : { ...row, document: readDocument(row.document) };
}

/** @returns whether there is such a save */
export async function setVersionName(
  db: Connection,
  studyId: string,
  kind: SaveKind,
  number: number,
  name: string | null,
): Promise<boolean> {
  const [result] = await db
    .update(saves)
    .set({ name })
    .where(and(ofStudy(studyId, kind), eq(saves.number, number)));
  return result.affectedRows === 1;
}
