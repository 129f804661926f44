import { and, between, eq } from 'drizzle-orm';
import { z } from 'zod';
import { mergedSchema } from '#shared/contracts/studies';
import { studyDocumentSchema, type StudyDocument } from '#shared/study/study.document';
import type { Connection, Transaction } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { saves, type SaveKind } from '#server/db/schema/saves';
import { studies } from '#server/db/schema/studies';
import { columnsOf, parseJson, readDocument } from '#server/studies/documents';

export interface NewSave {
  readonly studyId: string;
  readonly basedOn: number;
  readonly document: StudyDocument;
  readonly savedBy: string;
  readonly savedAt: Date;
  readonly requestKey: string;
  readonly deviceKey?: string | undefined;
  readonly merge?: Merge | null;
}

const mergeSchema = z.object({ sent: studyDocumentSchema, told: mergedSchema });
/** What was sent, and what others had saved meanwhile: kept, so that the same request gets the same answer. */
export type Merge = z.infer<typeof mergeSchema>;

/** Where a save stands among the others of its kind. */
export interface SavePlace {
  readonly kind: SaveKind;
  readonly number: number;
}

export async function insertSave(tx: Transaction, save: NewSave, place: SavePlace): Promise<void> {
  await tx.insert(saves).values({ ...save, ...place });
}

/** The study's row must be locked: its counters say which number comes next. */
export async function noteNewest(tx: Transaction, save: NewSave, number: number): Promise<void> {
  const columns = { newestNumber: number, savedAt: save.savedAt, ...columnsOf(save.document) };
  await tx.update(studies).set(columns).where(eq(studies.id, save.studyId));
}

export async function noteSetAside(tx: Transaction, studyId: string, count: number): Promise<void> {
  await tx.update(studies).set({ setAsideCount: count }).where(eq(studies.id, studyId));
}

export interface KeptSave extends SavePlace {
  readonly document: StudyDocument;
  readonly merge: Merge | null;
}

const KEPT = { kind: saves.kind, number: saves.number, document: saves.document, merge: saves.merge };

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
  if (row === undefined) return null;
  const merge = mergeSchema.nullable().parse(parseJson(row.merge));
  return { ...row, document: readDocument(row.document), merge };
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

/** @returns who made accepted saves from one number to another, both included; each once */
export async function findSavers(
  db: Connection,
  studyId: string,
  from: number,
  to: number,
): Promise<{ id: string; name: string }[]> {
  return db
    .selectDistinct({ id: accounts.id, name: accounts.name })
    .from(saves)
    .innerJoin(accounts, eq(accounts.id, saves.savedBy))
    .where(and(eq(saves.studyId, studyId), eq(saves.kind, 'accepted'), between(saves.number, from, to)))
    .orderBy(accounts.name);
}
