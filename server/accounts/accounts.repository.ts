import { and, eq, isNull } from 'drizzle-orm';
import type { Account, Role } from '#shared/contracts/accounts';
import type { Connection } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';

export interface NewAccount {
  readonly id: string;
  /** Normalised. */
  readonly email: string;
  readonly name: string;
  readonly role: Role;
  readonly passwordHash: string;
  readonly confirmedAt: Date | null;
  readonly createdAt: Date;
}

const PUBLIC = { id: accounts.id, email: accounts.email, name: accounts.name, role: accounts.role };

/** With what signing in needs to know; none of it but the account itself leaves the server. */
export interface AccountRecord extends Account {
  readonly passwordHash: string;
  readonly confirmedAt: Date | null;
}

const RECORD = { ...PUBLIC, passwordHash: accounts.passwordHash, confirmedAt: accounts.confirmedAt };

export async function findAccountByEmail(db: Connection, email: string): Promise<AccountRecord | null> {
  const [row] = await db.select(RECORD).from(accounts).where(eq(accounts.email, email));
  return row ?? null;
}

export async function findAccountById(db: Connection, id: string): Promise<AccountRecord | null> {
  const [row] = await db.select(RECORD).from(accounts).where(eq(accounts.id, id));
  return row ?? null;
}

export async function findAccount(db: Connection, id: string): Promise<Account | null> {
  const [row] = await db.select(PUBLIC).from(accounts).where(eq(accounts.id, id));
  return row ?? null;
}

/** @throws a duplicate when the address has an account already. */
export async function insertAccount(db: Connection, account: NewAccount): Promise<void> {
  await db.insert(accounts).values(account);
}

/** Somebody signs up again before the address was confirmed: the newer sign-up is the one that counts. */
export async function replaceUnconfirmed(db: Connection, account: NewAccount): Promise<void> {
  const { name, role, passwordHash, email } = account;
  await db
    .update(accounts)
    .set({ name, role, passwordHash })
    .where(and(eq(accounts.email, email), isNull(accounts.confirmedAt)));
}

export async function markConfirmed(db: Connection, id: string, now: Date): Promise<void> {
  await db
    .update(accounts)
    .set({ confirmedAt: now })
    .where(and(eq(accounts.id, id), isNull(accounts.confirmedAt)));
}

export async function setPasswordHash(db: Connection, id: string, passwordHash: string): Promise<void> {
  await db.update(accounts).set({ passwordHash }).where(eq(accounts.id, id));
}

/** Where the hash is no longer the one that was checked, the password was changed meanwhile: that one stays. */
export async function replacePasswordHash(
  db: Connection,
  { id, passwordHash: checked }: Pick<AccountRecord, 'id' | 'passwordHash'>,
  passwordHash: string,
): Promise<void> {
  await db
    .update(accounts)
    .set({ passwordHash })
    .where(and(eq(accounts.id, id), eq(accounts.passwordHash, checked)));
}
