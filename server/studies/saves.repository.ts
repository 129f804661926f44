import { and, eq } from 'drizzle-orm';
import type { StudyDocument } from '#shared/study/study.document';
import type { Connection, Transaction } from '#server/db/connection';
import { saves, type SaveKind } from '#server/db/schema/saves';
import { studies } from '#server/db/schema/studies';
import { readDocument } from '#server/studies/documents';

export interface NewSave {
  readonly studyId: string;
  readonly basedOn: number;
  readonly document: StudyDocument;
  readonly savedBy: string;
  readonly savedAt: Date;
  readonly requestKey: string;
}

/** Where a save stands among the others of its kind. */
export interface SavePlace {
  readonly kind: SaveKind;
  readonly number: number;
}

export async function insertSave(tx: Transaction, save: NewSave, place: SavePlace): Promise<void> {
  await tx.insert(saves).values({ ...save, ...place });
}

/** The study's row must be locked: its counters say which number comes next. */
export async function noteNewest(tx: Transaction, studyId: string, number: number, now: Date): Promise<void> {
  await tx.update(studies).set({ newestNumber: number, savedAt: now }).where(eq(studies.id, studyId));
}

export async function noteSetAside(tx: Transaction, studyId: string, count: number): Promise<void> {
  await tx.update(studies).set({ setAsideCount: count }).where(eq(studies.id, studyId));
}

export interface KeptSave extends SavePlace {
  readonly document: StudyDocument;
}

const KEPT = { kind: saves.kind, number: saves.number, document: saves.document };

/** @returns what this very request made when it came before. */
export async function findSaveByKey(
  db: Connection,
  studyId: string,
  savedBy: string,
  requestKey: string,
): Promise<KeptSave | null> {
  const [row] = await db
    .select(KEPT)
    .from(saves)
    .where(and(eq(saves.studyId, studyId), eq(saves.savedBy, savedBy), eq(saves.requestKey, requestKey)));
  return row === undefined ? null : { ...row, document: readDocument(row.document) };
}

export async function findAcceptedDocument(
  db: Connection,
  studyId: string,
  number: number,
): Promise<StudyDocument | null> {
  const [row] = await db
    .select({ document: saves.document })
    .from(saves)
    .where(and(eq(saves.studyId, studyId), eq(saves.kind, 'accepted'), eq(saves.number, number)));
  return row === undefined ? null : readDocument(row.document);
}
