import { and, asc, eq, type SQL } from 'drizzle-orm';
import type { Connection } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { annotations } from '#server/db/schema/annotations';

export type NewAnnotation = typeof annotations.$inferInsert;

function annotationQuery(db: Connection, which: SQL | undefined) {
  return db
    .select({
      id: annotations.id,
      authorId: annotations.authorId,
      authorName: accounts.name,
      chordId: annotations.chordId,
      text: annotations.text,
      writtenAt: annotations.writtenAt,
    })
    .from(annotations)
    .innerJoin(accounts, eq(accounts.id, annotations.authorId))
    .where(which);
}
export type AnnotationRow = Awaited<ReturnType<typeof annotationQuery>>[number];

export async function findAnnotations(db: Connection, studyId: string): Promise<AnnotationRow[]> {
  return annotationQuery(db, eq(annotations.studyId, studyId)).orderBy(
    asc(annotations.writtenAt),
    asc(annotations.id),
  );
}

export async function findAnnotation(
  db: Connection,
  studyId: string,
  annotationId: string,
): Promise<AnnotationRow | null> {
  const which = and(eq(annotations.id, annotationId), eq(annotations.studyId, studyId));
  const [row] = await annotationQuery(db, which);
  return row ?? null;
}

export async function findAnnotationByKey(
  db: Connection,
  { studyId, authorId, requestKey }: Pick<NewAnnotation, 'studyId' | 'authorId' | 'requestKey'>,
): Promise<AnnotationRow | null> {
  const [row] = await annotationQuery(
    db,
    and(
      eq(annotations.studyId, studyId),
      eq(annotations.authorId, authorId),
      eq(annotations.requestKey, requestKey),
    ),
  );
  return row ?? null;
}

export async function insertAnnotation(db: Connection, annotation: NewAnnotation): Promise<void> {
  await db.insert(annotations).values(annotation);
}

export async function removeAnnotation(db: Connection, annotationId: string): Promise<void> {
  await db.delete(annotations).where(eq(annotations.id, annotationId));
}
