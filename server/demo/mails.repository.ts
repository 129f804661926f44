import { desc, inArray } from 'drizzle-orm';
import type { Mail } from '#shared/contracts/demo';
import type { Db } from '#server/db/connection';
import { demoMails } from '#server/db/schema/demo-mails';

export type ReceivedMail = Omit<typeof demoMails.$inferInsert, 'id'>;

const MOST_SHOWN = 100;
const MAX_HEADER = 300;

export async function keepDemoMail(db: Db, mail: ReceivedMail): Promise<void> {
  await db.insert(demoMails).values({
    ...mail,
    to: mail.to.slice(0, MAX_HEADER),
    from: mail.from.slice(0, MAX_HEADER),
    subject: mail.subject.slice(0, MAX_HEADER),
  });
}

export async function listDemoMails(db: Db): Promise<Mail[]> {
  const rows = await db.select().from(demoMails).orderBy(desc(demoMails.id)).limit(MOST_SHOWN);
  return rows.map((row) => ({ ...row, id: String(row.id), receivedAt: row.receivedAt.toISOString() }));
}

/** The mail page shows the newest only: what lies behind them goes. */
export async function pruneDemoMails(db: Db): Promise<void> {
  const old = await db
    .select({ id: demoMails.id })
    .from(demoMails)
    .orderBy(desc(demoMails.id))
    .limit(1000)
    .offset(MOST_SHOWN);
  if (old.length > 0)
    await db.delete(demoMails).where(
      inArray(
        demoMails.id,
        old.map(({ id }) => id),
      ),
    );
}
