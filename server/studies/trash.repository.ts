import { and, desc, eq, isNotNull, lt, or, type SQL } from 'drizzle-orm';
import type { Connection } from '#server/db/connection';
import { studies } from '#server/db/schema/studies';
import type { Viewer } from '#server/http/bind';

function behind(after: { at: Date; id: string } | null): SQL | undefined {
  if (after === null) return undefined;
  const { at, id } = after;
  return or(lt(studies.deletedAt, at), and(eq(studies.deletedAt, at), lt(studies.id, id)));
}

/** @returns deleted studies of the viewer's own, the last deleted first */
export async function findDeleted(
  db: Connection,
  viewer: Viewer,
  after: { at: Date; id: string } | null,
  limit: number,
) {
  const { id, title, chordCount, deletedAt } = studies;
  const rows = await db
    .select({ id, title, chordCount, deletedAt })
    .from(studies)
    .where(and(eq(studies.ownerId, viewer.id), isNotNull(studies.deletedAt), behind(after)))
    .orderBy(desc(studies.deletedAt), desc(studies.id))
    .limit(limit);
  return rows.flatMap((row) => (row.deletedAt === null ? [] : [{ ...row, deletedAt: row.deletedAt }]));
}
