import { and, eq, gt, isNull, lt } from 'drizzle-orm';
import { digestOf, randomSecret } from '#server/accounts/secrets';
import type { Connection } from '#server/db/connection';
import { tokens, type TokenPurpose } from '#server/db/schema/tokens';

const HOUR_MS = 60 * 60 * 1000;
const LIFETIME_MS: Readonly<Record<TokenPurpose, number>> = {
  confirmation: 48 * HOUR_MS,
  'password-reset': HOUR_MS,
};

/** Makes the secret of a link; earlier ones for the same purpose end. Only its digest is kept. */
export async function issueToken(
  db: Connection,
  accountId: string,
  purpose: TokenPurpose,
  now: Date,
): Promise<string> {
  const secret = randomSecret();
  await endTokens(db, accountId, purpose, now);
  await db.insert(tokens).values({
    digest: digestOf(secret),
    accountId,
    purpose,
    createdAt: now,
    expiresAt: new Date(now.getTime() + LIFETIME_MS[purpose]),
  });
  return secret;
}

/** @returns whose it was, or null; of two that use it at once, one gets it: the update is the check. */
export async function useToken(
  db: Connection,
  secret: string,
  purpose: TokenPurpose,
  now: Date,
): Promise<string | null> {
  const fits = eq(tokens.digest, digestOf(secret));
  const [result] = await db
    .update(tokens)
    .set({ usedAt: now })
    .where(and(fits, eq(tokens.purpose, purpose), isNull(tokens.usedAt), gt(tokens.expiresAt, now)));
  if (result.affectedRows !== 1) return null;
  const [row] = await db.select({ accountId: tokens.accountId }).from(tokens).where(fits);
  return row?.accountId ?? null;
}

/** @returns whose it is, without using it. */
export async function peekToken(
  db: Connection,
  secret: string,
  purpose: TokenPurpose,
  now: Date,
): Promise<string | null> {
  const [row] = await db
    .select({ accountId: tokens.accountId })
    .from(tokens)
    .where(
      and(
        eq(tokens.digest, digestOf(secret)),
        eq(tokens.purpose, purpose),
        isNull(tokens.usedAt),
        gt(tokens.expiresAt, now),
      ),
    );
  return row?.accountId ?? null;
}

async function endTokens(db: Connection, accountId: string, purpose: TokenPurpose, now: Date): Promise<void> {
  await db
    .update(tokens)
    .set({ usedAt: now })
    .where(and(eq(tokens.accountId, accountId), eq(tokens.purpose, purpose), isNull(tokens.usedAt)));
}

export async function pruneTokens(db: Connection, now: Date): Promise<void> {
  await db.delete(tokens).where(lt(tokens.expiresAt, now));
}
