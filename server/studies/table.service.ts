import type { QueryOf, ResponseOf } from '#shared/contracts/endpoint';
import {
  DAYS_IN_TRASH,
  type listDeletedStudies,
  type listStudies,
  type readStudyFilters,
  type StudyRow,
  studyRowSchema,
} from '#shared/contracts/studies';
import { readMoment, readPosition, writePosition } from '#server/db/positions';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { findKeys, findRows, findTags, replaceTags } from '#server/studies/rows.repository';
import { lockStudy } from '#server/studies/studies.access';
import { findStudyIds, isDescending } from '#server/studies/studies.listing';
import { findDeleted } from '#server/studies/trash.repository';

const DAY_MS = 86_400_000;
const UNKNOWN = -1;
const keysSchema = studyRowSchema.shape.key.array();

type Filters = QueryOf<typeof listStudies>;

function listName(filters: Filters): string {
  return `studies ${filters.sort} ${isDescending(filters) ? 'down' : 'up'}`;
}

function sortedValue({ sort }: Filters, row: StudyRow): string | number {
  if (sort === 'title') return row.title;
  return sort === 'changed' ? Date.parse(row.savedAt) : (row.cloudiest ?? UNKNOWN);
}

export async function studiesPage(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  filters: Filters,
): Promise<ResponseOf<typeof listStudies>> {
  const { limit } = filters;
  const after = readPosition(listName(filters), filters.after);
  const ids = await findStudyIds(db, viewer, filters, after, limit + 1);
  const rows = await findRows(db, viewer, ids.slice(0, limit));
  const last = rows.at(-1);
  const isMore = ids.length > limit && last !== undefined;
  const next = isMore
    ? writePosition(listName(filters), { value: sortedValue(filters, last), id: last.id })
    : null;
  return { studies: rows, next };
}

export async function filtersFor(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
): Promise<ResponseOf<typeof readStudyFilters>> {
  return { tags: await findTags(db, viewer), keys: keysSchema.parse(await findKeys(db, viewer)) };
}

export async function setTags(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  studyId: string,
  tags: readonly string[],
): Promise<{ tags: string[] }> {
  const kept = await inTransaction(db, async (tx) => {
    await lockStudy(tx, viewer, studyId, 'read');
    return replaceTags(tx, viewer, studyId, tags);
  });
  return { tags: kept };
}

const TRASH = 'trash';

export async function deletedPage(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  { after, limit }: QueryOf<typeof listDeletedStudies>,
): Promise<ResponseOf<typeof listDeletedStudies>> {
  const rows = await findDeleted(db, viewer, readMoment(TRASH, after), limit + 1);
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  const studies = shown.map(({ deletedAt, ...row }) => ({
    ...row,
    deletedAt: deletedAt.toISOString(),
    goesAt: new Date(deletedAt.getTime() + DAYS_IN_TRASH * DAY_MS).toISOString(),
  }));
  const isMore = rows.length > limit && last !== undefined;
  const next = isMore ? writePosition(TRASH, { value: last.deletedAt.getTime(), id: last.id }) : null;
  return { studies, next };
}
