import { and, eq, lt, or, sql, type SQL } from 'drizzle-orm';
import { z } from 'zod';
import { DAYS_IN_TRASH } from '#shared/contracts/studies';
import type { Db } from '#server/db/connection';
import { annotations } from '#server/db/schema/annotations';
import { saves } from '#server/db/schema/saves';
import { shares } from '#server/db/schema/shares';
import { studies } from '#server/db/schema/studies';

const DAY_MS = 86_400_000;
/** Of the saves that nothing keeps for good: all of a week, one an hour for a month, one a day after. */
const ALL_FOR_DAYS = 7;
const HOURLY_FOR_DAYS = 30;
const AT_ONCE = 200;

function daysBefore(now: Date, days: number): Date {
  return new Date(now.getTime() - days * DAY_MS);
}

/** Whether a save was the newest one at some moment when something was hung on its study, or it was shared. */
function wasNewestAt(moments: SQL): SQL {
  return sql`exists (${moments} and moment >= old.saved_at and not exists (
    select 1 from ${saves} later where later.study_id = old.study_id and later.kind = 'accepted'
    and later.number > old.number and later.saved_at <= moment))`;
}

function superfluous(now: Date): SQL {
  const [week, month] = [daysBefore(now, ALL_FOR_DAYS), daysBefore(now, HOURLY_FOR_DAYS)];
  const annotated = sql`select 1 from (select study_id, written_at as moment from ${annotations}) said
    where said.study_id = old.study_id`;
  const shared = sql`select 1 from (select study_id, shared_at as moment from ${shares}) shown
    where shown.study_id = old.study_id`;
  return sql`select old.study_id as studyId, old.number as number from (
      select study_id, number, saved_at, row_number() over (
        partition by study_id,
          if(saved_at < ${month}, date_format(saved_at, '%Y-%m-%d'), date_format(saved_at, '%Y-%m-%d %H'))
        order by number desc) as place
      from ${saves} where kind = 'accepted' and name is null and saved_at < ${week}) old
    inner join ${studies} on ${studies.id} = old.study_id
    where old.place > 1 and old.number > 1 and old.number < ${studies.newestNumber}
      and not ${wasNewestAt(annotated)} and not ${wasNewestAt(shared)}
    limit ${AT_ONCE}`;
}

const rowsSchema = z
  .tuple([z.array(z.object({ studyId: z.string(), number: z.number().int() }))])
  .rest(z.unknown());

/** Thins out old saves; what is named, was annotated or shared, the first and the newest stay, and all set aside. */
export async function thinSaves(db: Db, now: Date): Promise<void> {
  for (;;) {
    const [rows] = rowsSchema.parse(await db.execute(superfluous(now)));
    if (rows.length === 0) return;
    const which = rows.map(({ studyId, number }) =>
      and(eq(saves.studyId, studyId), eq(saves.number, number)),
    );
    await db.delete(saves).where(and(eq(saves.kind, 'accepted'), or(...which)));
  }
}

/** Takes studies away for good that have lain in the trash for their time. */
export async function emptyTrash(db: Db, now: Date): Promise<void> {
  await db.delete(studies).where(lt(studies.deletedAt, daysBefore(now, DAYS_IN_TRASH)));
}
