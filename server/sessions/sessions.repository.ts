import { createHash } from 'node:crypto';
import { and, eq, gt, isNull, lt, sql } from 'drizzle-orm';
import { z } from 'zod';
import type { Connection, Db } from '#server/db/connection';
import { sessions } from '#server/db/schema/sessions';

export const IDLE_MS = 7 * 24 * 60 * 60 * 1000;
/** However much it is used, a session ends then. */
export const ABSOLUTE_MS = 30 * 24 * 60 * 60 * 1000;
/** Use is noted no more often than this: not every read should be a write. */
const TOUCH_EVERY_MS = 60 * 1000;

const dataSchema = z.object({ accountId: z.string().optional(), csrfToken: z.string().nullish() });

type KeptData = z.infer<typeof dataSchema>;

function digestOf(sid: string): Buffer {
  return createHash('sha256').update(sid).digest();
}

export async function loadSession(db: Db, sid: string, now: Date): Promise<KeptData | null> {
  const [row] = await db
    .select({ data: sessions.data })
    .from(sessions)
    .where(
      and(
        eq(sessions.id, digestOf(sid)),
        isNull(sessions.endedAt),
        gt(sessions.expiresAt, now),
        gt(sessions.endsAt, now),
      ),
    );
  return row === undefined ? null : dataSchema.parse(JSON.parse(row.data));
}

export async function keepSession(db: Db, sid: string, data: KeptData, now: Date): Promise<void> {
  const { accountId, csrfToken } = data;
  const expiresAt = new Date(now.getTime() + IDLE_MS);
  const row = { userId: accountId ?? null, data: JSON.stringify({ accountId, csrfToken }), expiresAt };
  await db
    .insert(sessions)
    .values({ ...row, id: digestOf(sid), createdAt: now, endsAt: new Date(now.getTime() + ABSOLUTE_MS) })
    .onDuplicateKeyUpdate({
      // A session that was ended meanwhile stays ended, whatever a slow request still wants to keep.
      set: {
        userId: sql`if(${sessions.endedAt} is null, values(${sessions.userId}), ${sessions.userId})`,
        data: sql`if(${sessions.endedAt} is null, values(${sessions.data}), ${sessions.data})`,
        expiresAt: sql`if(${sessions.endedAt} is null, values(${sessions.expiresAt}), ${sessions.expiresAt})`,
      },
    });
}

export async function touchSession(db: Db, sid: string, now: Date): Promise<void> {
  const expiresAt = new Date(now.getTime() + IDLE_MS);
  const stale = new Date(expiresAt.getTime() - TOUCH_EVERY_MS);
  await db
    .update(sessions)
    .set({ expiresAt })
    .where(and(eq(sessions.id, digestOf(sid)), isNull(sessions.endedAt), lt(sessions.expiresAt, stale)));
}

export async function endSession(db: Db, sid: string, now: Date): Promise<void> {
  await db
    .update(sessions)
    .set({ endedAt: now, data: '{}' })
    .where(and(eq(sessions.id, digestOf(sid)), isNull(sessions.endedAt)));
}

/** Ends every session of an account: its password was changed. */
export async function endSessionsOf(db: Connection, accountId: string, now: Date): Promise<void> {
  await db
    .update(sessions)
    .set({ endedAt: now, data: '{}' })
    .where(and(eq(sessions.userId, accountId), isNull(sessions.endedAt)));
}

/** Takes away what has expired, marks of ended sessions too. */
export async function pruneSessions(db: Db, now: Date): Promise<void> {
  await db.delete(sessions).where(lt(sessions.expiresAt, now));
}
