import { and, eq, isNull, ne, sql, type SQL } from 'drizzle-orm';
import { unionAll } from 'drizzle-orm/mysql-core';
import type { QueryOf } from '#shared/contracts/endpoint';
import type { listStudies, StudySort } from '#shared/contracts/studies';
import type { Connection } from '#server/db/connection';
import { containing } from '#server/db/like';
import { momentOf, type Position } from '#server/db/positions';
import { shares } from '#server/db/schema/shares';
import { studies } from '#server/db/schema/studies';
import { studyTags } from '#server/db/schema/study-tags';
import type { Viewer } from '#server/http/bind';

type Filters = QueryOf<typeof listStudies>;

/** What a list is sorted by, as a number or text that a position can hold. */
const SORTED_BY: Readonly<Record<StudySort, SQL>> = {
  changed: sql`${studies.savedAt}`,
  title: sql`${studies.title}`,
  clouded: sql`${studies.cloudiest}`,
};

function valueOf(sort: StudySort, after: Position): Position['value'] | Date {
  return sort === 'changed' ? momentOf(after) : after.value;
}

export function isDescending({ sort, order }: Pick<Filters, 'sort' | 'order'>): boolean {
  return (order ?? (sort === 'title' ? 'asc' : 'desc')) === 'desc';
}

function behind(filters: Filters, after: Position | null): SQL | undefined {
  if (after === null) return undefined;
  const [by, value] = [SORTED_BY[filters.sort], valueOf(filters.sort, after)];
  const beyond = isDescending(filters) ? sql.raw('<') : sql.raw('>');
  return sql`(${by} ${beyond} ${value} or (${by} = ${value} and ${studies.id} ${beyond} ${after.id}))`;
}

function found(search: string | undefined): SQL | undefined {
  if (!search) return undefined;
  const pattern = containing(search);
  return sql`(${studies.title} like ${pattern} escape '!' or ${studies.about} like ${pattern} escape '!')`;
}

function tagged(viewer: Viewer, tag: string | undefined): SQL | undefined {
  if (tag === undefined) return undefined;
  return sql`exists (select 1 from ${studyTags} where ${studyTags.accountId} = ${viewer.id}
    and ${studyTags.studyId} = ${studies.id} and ${studyTags.tag} = ${tag})`;
}

function matching(viewer: Viewer, { search, tag, tonic, mode, from, to }: Filters): SQL | undefined {
  return and(
    isNull(studies.deletedAt),
    found(search),
    tagged(viewer, tag),
    tonic === undefined ? undefined : eq(studies.keyTonic, tonic),
    mode === undefined ? undefined : eq(studies.keyMode, mode),
    from === undefined && to === undefined
      ? undefined
      : sql`${studies.cloudiest} between ${from ?? 0} and ${to ?? 100}`,
  );
}

/**
 * @returns ids in the list's order. Each half reads no more than a page by its own index; a condition with `or` would
 *   read all.
 */
export async function findStudyIds(
  db: Connection,
  viewer: Viewer,
  filters: Filters,
  after: Position | null,
  limit: number,
): Promise<string[]> {
  const by = SORTED_BY[filters.sort];
  const way = sql.raw(isDescending(filters) ? 'desc' : 'asc');
  const order = [sql`${by} ${way}`, sql`${studies.id} ${way}`] as const;
  const which = and(matching(viewer, filters), behind(filters, after));
  const columns = { id: studies.id, by: by.as('sorted_by') };
  const own = db
    .select(columns)
    .from(studies)
    .where(and(eq(studies.ownerId, viewer.id), which))
    .orderBy(...order)
    .limit(limit);
  const received = db
    .select(columns)
    .from(shares)
    .innerJoin(studies, eq(studies.id, shares.studyId))
    .where(and(eq(shares.email, viewer.email), ne(studies.ownerId, viewer.id), which))
    .orderBy(...order)
    .limit(limit);
  if (filters.whose === 'own') return idsOf(await own);
  if (filters.whose === 'received') return idsOf(await received);
  return idsOf(
    await unionAll(own, received)
      .orderBy(sql`sorted_by ${way}`, sql`id ${way}`)
      .limit(limit),
  );
}

function idsOf(rows: readonly { readonly id: string }[]): string[] {
  return rows.map(({ id }) => id);
}

/** What both the rows and the filters are of: studies that the viewer may see, at hand by the two indexes. */
export function visibleTo(db: Connection, viewer: Viewer) {
  const key = { tonic: studies.keyTonic, mode: studies.keyMode };
  const own = db
    .select(key)
    .from(studies)
    .where(and(eq(studies.ownerId, viewer.id), isNull(studies.deletedAt)));
  const received = db
    .select(key)
    .from(shares)
    .innerJoin(studies, eq(studies.id, shares.studyId))
    .where(and(eq(shares.email, viewer.email), isNull(studies.deletedAt)));
  return { own, received };
}
