import { and, asc, eq, getTableColumns, isNull } from 'drizzle-orm';
import type { Share } from '#shared/contracts/shares';
import type { Connection } from '#server/db/connection';
import { shares } from '#server/db/schema/shares';
import { studies } from '#server/db/schema/studies';
import type { Viewer } from '#server/http/bind';

type Row = typeof shares.$inferSelect;

function toShare({ id, email, may, sharedAt }: Row): Share {
  return { id, email, may, sharedAt: sharedAt.toISOString() };
}

/** @returns the shares of a study of the viewer's own; of anybody else's, none. */
export async function findShares(db: Connection, viewer: Viewer, studyId: string): Promise<Share[]> {
  const rows = await db
    .select(getTableColumns(shares))
    .from(shares)
    .innerJoin(studies, eq(studies.id, shares.studyId))
    .where(and(eq(shares.studyId, studyId), eq(studies.ownerId, viewer.id), isNull(studies.deletedAt)))
    .orderBy(asc(shares.email));
  return rows.map(toShare);
}

export async function insertShare(db: Connection, share: Row): Promise<void> {
  await db.insert(shares).values(share);
}

/** @returns the share of a study with an address; it must be there. */
export async function changeShare(
  db: Connection,
  studyId: string,
  email: string,
  may: Share['may'],
): Promise<Share | null> {
  const which = and(eq(shares.studyId, studyId), eq(shares.email, email));
  await db.update(shares).set({ may }).where(which);
  const [row] = await db.select().from(shares).where(which);
  return row === undefined ? null : toShare(row);
}

/** @returns whether there was one. */
export async function removeShare(db: Connection, studyId: string, shareId: string): Promise<boolean> {
  const [result] = await db.delete(shares).where(and(eq(shares.id, shareId), eq(shares.studyId, studyId)));
  return result.affectedRows === 1;
}
