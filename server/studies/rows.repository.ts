import { and, asc, count, eq, inArray, isNull, sql } from 'drizzle-orm';
import { union } from 'drizzle-orm/mysql-core';
import { PROFILES_IN_ROW, studyRowSchema, type StudyRow } from '#shared/contracts/studies';
import type { Connection } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { shares } from '#server/db/schema/shares';
import { studies } from '#server/db/schema/studies';
import { studyTags } from '#server/db/schema/study-tags';
import type { Viewer } from '#server/http/bind';
import { relationOf, seenBy, shareOf } from '#server/studies/studies.access';
import { visibleTo } from '#server/studies/studies.listing';
import { readSummary } from '#server/studies/summaries.repository';

const ROW = {
  id: studies.id,
  number: studies.newestNumber,
  title: studies.title,
  about: studies.about,
  keyTonic: studies.keyTonic,
  keyMode: studies.keyMode,
  chordCount: studies.chordCount,
  cloudiest: studies.cloudiest,
  summary: studies.summary,
  summaryDue: studies.summaryDue,
  ownerId: studies.ownerId,
  may: shares.may,
  ownerName: accounts.name,
  savedAt: studies.savedAt,
};

function rowQuery(db: Connection, viewer: Viewer, ids: readonly string[]) {
  return db
    .select(ROW)
    .from(studies)
    .innerJoin(accounts, eq(accounts.id, studies.ownerId))
    .leftJoin(shares, shareOf(viewer))
    .where(and(inArray(studies.id, [...ids]), isNull(studies.deletedAt), seenBy(viewer)));
}

type Row = Awaited<ReturnType<typeof rowQuery>>[number];

function toRow(viewer: Viewer, row: Row, tags: readonly string[]): StudyRow {
  const { id, number, title, about, chordCount, cloudiest, summaryDue, ownerName } = row;
  return studyRowSchema.parse({
    ...{ id, number, title, about, chordCount, ownerName, tags },
    key: { tonic: row.keyTonic, mode: row.keyMode },
    relation: relationOf(viewer, row),
    savedAt: row.savedAt.toISOString(),
    cloudiest: cloudiest < 0 ? null : cloudiest,
    chords: readSummary(row.summary).slice(0, PROFILES_IN_ROW),
    summedUp: !summaryDue,
  });
}

/** @returns the tags of each of these studies, sorted */
async function tagsOf(
  db: Connection,
  viewer: Viewer,
  ids: readonly string[],
): Promise<ReadonlyMap<string, readonly string[]>> {
  const rows = await db
    .select({ studyId: studyTags.studyId, tag: studyTags.tag })
    .from(studyTags)
    .where(and(eq(studyTags.accountId, viewer.id), inArray(studyTags.studyId, [...ids])))
    .orderBy(asc(studyTags.tag));
  const tags = new Map<string, string[]>();
  for (const { studyId, tag } of rows) tags.set(studyId, [...(tags.get(studyId) ?? []), tag]);
  return tags;
}

/** @returns the rows of these studies, in this order */
export async function findRows(db: Connection, viewer: Viewer, ids: readonly string[]): Promise<StudyRow[]> {
  if (ids.length === 0) return [];
  const [rows, tags] = [await rowQuery(db, viewer, ids), await tagsOf(db, viewer, ids)];
  const byId = new Map(rows.map((row) => [row.id, row]));
  return ids.flatMap((id) => {
    const row = byId.get(id);
    return row === undefined ? [] : [toRow(viewer, row, tags.get(id) ?? [])];
  });
}

/** @returns the viewer's tags of studies that are not deleted, with how many have each */
export async function findTags(db: Connection, viewer: Viewer): Promise<{ tag: string; count: number }[]> {
  return db
    .select({ tag: studyTags.tag, count: count() })
    .from(studyTags)
    .innerJoin(studies, eq(studies.id, studyTags.studyId))
    .leftJoin(shares, shareOf(viewer))
    .where(and(eq(studyTags.accountId, viewer.id), isNull(studies.deletedAt), seenBy(viewer)))
    .groupBy(studyTags.tag)
    .orderBy(asc(studyTags.tag));
}

/** @returns the keys of the studies that the viewer may see, each once */
export async function findKeys(db: Connection, viewer: Viewer) {
  const { own, received } = visibleTo(db, viewer);
  return union(own, received).orderBy(sql`key_tonic`, sql`key_mode`);
}

export async function replaceTags(
  db: Connection,
  viewer: Viewer,
  studyId: string,
  tags: readonly string[],
): Promise<string[]> {
  await db.delete(studyTags).where(and(eq(studyTags.accountId, viewer.id), eq(studyTags.studyId, studyId)));
  if (tags.length > 0) {
    const rows = tags.map((tag) => ({ accountId: viewer.id, studyId, tag }));
    // What people take for one word, such as `Brass` and `brass`, is one tag.
    await db.insert(studyTags).ignore().values(rows);
  }
  return [...((await tagsOf(db, viewer, [studyId])).get(studyId) ?? [])];
}
