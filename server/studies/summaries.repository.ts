import { and, eq, notInArray, sql } from 'drizzle-orm';
import { z } from 'zod';
import { chordProfileSchema } from '#shared/contracts/chord-profiles';
import type { StudyDocument } from '#shared/study/study.document';
import type { Connection } from '#server/db/connection';
import { saves } from '#server/db/schema/saves';
import { NOT_YET_KNOWN, studies } from '#server/db/schema/studies';
import { parseJson, readDocument } from '#server/studies/documents';

const summarySchema = z.array(
  chordProfileSchema.extend({
    /** The model's edition, a dot, and a digest of the chord and its settings: what is as it was is not judged again. */
    of: z.string(),
  }),
);
/** The profiles of a study's chords, in their order. */
export type Summary = z.infer<typeof summarySchema>;

/** @returns nothing where a study is not summed up yet, or was by another edition of the program */
export function readSummary(column: unknown): Summary {
  const parsed = summarySchema.safeParse(parseJson(column));
  return parsed.success ? parsed.data : [];
}

export interface DueStudy {
  readonly id: string;
  readonly number: number;
  readonly document: StudyDocument;
  readonly known: Summary;
}

/** @returns a study whose newest save is not summed up yet */
export async function findDueStudy(db: Connection, besides: readonly string[]): Promise<DueStudy | null> {
  const due = eq(studies.summaryDue, true);
  const [row] = await db
    .select({
      id: studies.id,
      number: studies.newestNumber,
      document: saves.document,
      summary: studies.summary,
    })
    .from(studies)
    .innerJoin(
      saves,
      and(eq(saves.studyId, studies.id), eq(saves.kind, 'accepted'), eq(saves.number, studies.newestNumber)),
    )
    .where(besides.length > 0 ? and(due, notInArray(studies.id, [...besides])) : due)
    .limit(1);
  if (row === undefined) return null;
  const { id, number } = row;
  return { id, number, document: readDocument(row.document), known: readSummary(row.summary) };
}

/** Of a study that was saved again meanwhile nothing is kept: that save is due. */
export async function keepSummary(db: Connection, { id, number }: DueStudy, summary: Summary): Promise<void> {
  const cloudiest = Math.max(NOT_YET_KNOWN, ...summary.map(({ index }) => index));
  await db
    .update(studies)
    .set({ summary, cloudiest, summaryDue: false })
    .where(and(eq(studies.id, id), eq(studies.newestNumber, number)));
}

/** Studies that another edition of the model summed up are due again. */
export async function markOutdated(db: Connection, edition: string): Promise<void> {
  await db
    .update(studies)
    .set({ summaryDue: true })
    .where(
      and(
        eq(studies.summaryDue, false),
        sql`substring_index(coalesce(json_value(${studies.summary}, '$[0].of'), ''), '.', 1) <> ${edition}`,
      ),
    );
}
