import { and, desc, eq, inArray, isNull, lt, ne, or, type SQL } from 'drizzle-orm';
import { unionAll } from 'drizzle-orm/mysql-core';
import type { Study } from '#shared/contracts/studies';
import type { Connection } from '#server/db/connection';
import { shares } from '#server/db/schema/shares';
import { studies } from '#server/db/schema/studies';
import type { Viewer } from '#server/http/bind';
import { studyQuery, toStudy } from '#server/studies/studies.repository';

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
