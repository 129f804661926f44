import { createHash } from 'node:crypto';
import { eq, lt } from 'drizzle-orm';
import { ipKeyGenerator } from 'express-rate-limit';
import type { Request } from 'express';
import type { Db } from '#server/db/connection';
import { limits } from '#server/db/schema/limits';
import { inTransaction } from '#server/db/transaction';
import { RequestError } from '#server/http/request-error';
import { MAIL_FROM_ADDRESS, MAIL_PER_MAILBOX, type LimitRule } from '#server/limits/limits.rules';

/** A household or a school has a whole prefix of IPv6 addresses. */
const IPV6_PREFIX = 56;

/** Where a request comes from, as far as limits are concerned. */
export function addressOf(req: Request): string {
  return ipKeyGenerator(req.ip ?? 'unknown', IPV6_PREFIX);
}

function idOf(rule: LimitRule, subject: string): Buffer {
  return createHash('sha256').update(`${rule.name}\n${subject}`).digest();
}

function tooMany(waitMs: number): RequestError {
  const retryAfterS = Math.ceil(waitMs / 1000);
  const wait = retryAfterS > 90 ? `${Math.ceil(retryAfterS / 60)} minutes` : `${retryAfterS} seconds`;
  return new RequestError(429, 'rate.limited', `That was tried too often. Please wait ${wait}.`, {
    retryAfterS,
    details: { retryAfterS },
  });
}

interface Counter {
  readonly count: number;
  readonly blockedUntil: Date | null;
  readonly resetsAt: Date;
}

/** What a counter becomes by one more try. */
function countOn(rule: LimitRule, counter: Counter, now: Date): Counter {
  const fresh = counter.resetsAt <= now;
  const count = fresh ? 1 : counter.count + 1;
  const windowEnd = new Date(now.getTime() + rule.windowMs);
  const resetsAt = fresh || rule.sliding ? windowEnd : counter.resetsAt;
  if (count < rule.free) return { count, resetsAt, blockedUntil: null };
  const until = now.getTime() + rule.delayMs(count - rule.free + 1);
  return {
    count,
    resetsAt,
    blockedUntil: new Date(rule.sliding ? until : Math.min(until, resetsAt.getTime())),
  };
}

/**
 * Counts one try before it is made, so that many at once cannot slip through together.
 * @throws RequestError 429 when the subject has to wait; that try is not counted.
 */
export async function countTry(db: Db, rule: LimitRule, subject: string, now: Date): Promise<void> {
  const id = idOf(rule, subject);
  const waitMs = await inTransaction(db, async (tx) => {
    await tx
      .insert(limits)
      .values({ id, count: 0, resetsAt: now, blockedUntil: null })
      .onDuplicateKeyUpdate({ set: { id } });
    const [counter] = await tx.select().from(limits).where(eq(limits.id, id)).for('update');
    if (counter === undefined) return 0;
    if (counter.blockedUntil !== null && counter.blockedUntil > now) {
      return counter.blockedUntil.getTime() - now.getTime();
    }
    await tx
      .update(limits)
      .set(countOn(rule, counter, now))
      .where(eq(limits.id, id));
    return 0;
  });
  if (waitMs > 0) throw tooMany(waitMs);
}

/** Counts a try at what two parties share: first by the one place it comes from, then from everywhere. */
export async function countSharedTry(
  db: Db,
  rules: { readonly fromAddress: LimitRule; readonly inAll: LimitRule },
  subject: string,
  address: string,
  now: Date,
): Promise<void> {
  // The tighter first: what it turns away does not count against the others.
  await countTry(db, rules.fromAddress, placeOf(subject, address), now);
  await countTry(db, rules.inAll, subject, now);
}

/** Counts a mail that anybody can ask for, known or not. */
export function countMail(db: Db, email: string, address: string, now: Date): Promise<void> {
  return countSharedTry(db, { fromAddress: MAIL_FROM_ADDRESS, inAll: MAIL_PER_MAILBOX }, email, address, now);
}

/** The subject of a rule about one party and the address that it comes from. */
export function placeOf(subject: string, address: string): string {
  return `${subject}\n${address}`;
}

/** The try was a good one: those before it count no more. */
export async function forgetTries(db: Db, rule: LimitRule, subject: string): Promise<void> {
  await db.delete(limits).where(eq(limits.id, idOf(rule, subject)));
}

export async function pruneLimits(db: Db, now: Date): Promise<void> {
  await db.delete(limits).where(lt(limits.resetsAt, now));
}
