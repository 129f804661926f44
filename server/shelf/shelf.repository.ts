import { and, desc, eq, lt, or, sql, type SQL } from 'drizzle-orm';
import { shelvedChordSchema, type ShelfVoicing } from '#shared/contracts/shelf';
import type { Connection } from '#server/db/connection';
import { containing } from '#server/db/like';
import { shelf } from '#server/db/schema/shelf';
import type { Viewer } from '#server/http/bind';
import { parseJson } from '#server/studies/documents';

type Row = typeof shelf.$inferSelect;
export type NewVoicing = typeof shelf.$inferInsert;

function toVoicing({ id, name, voicing, keptAt }: Row): ShelfVoicing {
  return { id, name, voicing: shelvedChordSchema.parse(parseJson(voicing)), keptAt: keptAt.toISOString() };
}

function behind(after: { at: Date; id: string } | null): SQL | undefined {
  if (after === null) return undefined;
  const { at, id } = after;
  return or(lt(shelf.keptAt, at), and(eq(shelf.keptAt, at), lt(shelf.id, id)));
}

/** @returns the viewer's own voicings, the last kept first */
export async function findVoicings(
  db: Connection,
  viewer: Viewer,
  { after, search, limit }: { after: { at: Date; id: string } | null; search: string; limit: number },
): Promise<ShelfVoicing[]> {
  const named = search ? sql`${shelf.name} like ${containing(search)} escape '!'` : undefined;
  const rows = await db
    .select()
    .from(shelf)
    .where(and(eq(shelf.ownerId, viewer.id), named, behind(after)))
    .orderBy(desc(shelf.keptAt), desc(shelf.id))
    .limit(limit);
  return rows.map(toVoicing);
}

function own(viewer: Viewer, id: string): SQL | undefined {
  return and(eq(shelf.id, id), eq(shelf.ownerId, viewer.id));
}

export async function findVoicing(db: Connection, viewer: Viewer, id: string): Promise<ShelfVoicing | null> {
  const [row] = await db.select().from(shelf).where(own(viewer, id));
  return row === undefined ? null : toVoicing(row);
}

export async function findVoicingByKey(
  db: Connection,
  viewer: Viewer,
  requestKey: string,
): Promise<ShelfVoicing | null> {
  const [row] = await db
    .select()
    .from(shelf)
    .where(and(eq(shelf.ownerId, viewer.id), eq(shelf.requestKey, requestKey)));
  return row === undefined ? null : toVoicing(row);
}

export async function insertVoicing(db: Connection, voicing: NewVoicing): Promise<void> {
  await db.insert(shelf).values(voicing);
}

export async function setName(db: Connection, viewer: Viewer, id: string, name: string): Promise<void> {
  await db.update(shelf).set({ name }).where(own(viewer, id));
}

/** @returns whether there was one */
export async function removeVoicing(db: Connection, viewer: Viewer, id: string): Promise<boolean> {
  const [result] = await db.delete(shelf).where(own(viewer, id));
  return result.affectedRows === 1;
}
