import { and, asc, eq, isNotNull, lte } from 'drizzle-orm';
import { randomSecret } from '#server/accounts/secrets';
import type { Connection, Db, Transaction } from '#server/db/connection';
import { outbox } from '#server/db/schema/outbox';
import type { Letter } from '#server/mail/letters';
import { renderHtml, renderSubject, renderText } from '#server/mail/rendering';

export interface Recipient {
  readonly name: string;
  readonly email: string;
}

/** Puts a mail down to be sent, in the transaction of its cause: both happen or neither does. */
export async function putInOutbox(tx: Transaction, to: Recipient, letter: Letter, now: Date): Promise<void> {
  await tx.insert(outbox).values({
    id: randomSecret(),
    toEmail: to.email,
    toName: to.name,
    subject: renderSubject(letter),
    text: renderText(letter),
    html: renderHtml(letter),
    createdAt: now,
    dueAt: now,
  });
}

export type OutboxMail = typeof outbox.$inferSelect;

const BATCH = 10;
/** Longer than a try can take: only then is a mail free again for another process. */
export const LEASE_MS = 3 * 60 * 1000;

/** @returns mails that are due and now this process's own to send: the update is the claim. */
export async function claimDueMails(db: Db, now: Date): Promise<OutboxMail[]> {
  const due = await db
    .select()
    .from(outbox)
    .where(and(isNotNull(outbox.dueAt), lte(outbox.dueAt, now)))
    .orderBy(asc(outbox.dueAt))
    .limit(BATCH);
  const claimed: OutboxMail[] = [];
  for (const mail of due) if (await claim(db, mail, now)) claimed.push(mail);
  return claimed;
}

async function claim(db: Db, mail: OutboxMail, now: Date): Promise<boolean> {
  const [result] = await db
    .update(outbox)
    .set({ dueAt: new Date(now.getTime() + LEASE_MS), attempts: mail.attempts + 1 })
    .where(and(eq(outbox.id, mail.id), eq(outbox.attempts, mail.attempts), lte(outbox.dueAt, now)));
  return result.affectedRows === 1;
}

/** A mail that is done with keeps no text: links in it are secrets. */
const DONE = { dueAt: null, text: '', html: '' } as const;

export async function markSent(db: Connection, id: string, now: Date): Promise<void> {
  await db
    .update(outbox)
    .set({ ...DONE, sentAt: now })
    .where(eq(outbox.id, id));
}

export async function markGivenUp(db: Connection, id: string, fault: string, now: Date): Promise<void> {
  await db
    .update(outbox)
    .set({ ...DONE, givenUpAt: now, lastFault: fault })
    .where(eq(outbox.id, id));
}

export async function putOff(db: Connection, id: string, fault: string, dueAt: Date): Promise<void> {
  await db.update(outbox).set({ dueAt, lastFault: fault }).where(eq(outbox.id, id));
}
