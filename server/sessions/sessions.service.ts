import type { Account } from '#shared/contracts/accounts';
import {
  findAccountByEmail,
  replacePasswordHash,
  type AccountRecord,
} from '#server/accounts/accounts.repository';
import { normaliseEmail } from '#server/accounts/email';
import type { Deps } from '#server/deps';
import { RequestError } from '#server/http/request-error';
import { SIGN_IN_FROM_ADDRESS, SIGN_IN_PER_ACCOUNT, SIGN_IN_PER_ADDRESS } from '#server/limits/limits.rules';
import { countSharedTry, countTry, forgetTries, placeOf } from '#server/limits/limits.service';

type ServiceDeps = Pick<Deps, 'db' | 'clock' | 'passwords'>;

/** Does not tell which of the two it was. */
function refused(): RequestError {
  return new RequestError(401, 'sign-in.refused', 'This address and this password do not belong together.');
}

/** Told only to somebody who knows the password. */
function unconfirmed(): RequestError {
  return new RequestError(
    403,
    'account.unconfirmed',
    'Your address is not confirmed yet: open the link in the mail that we sent you, or ask for a new one.',
  );
}

/** The cost was raised since: now that the password is at hand, it is hashed anew. */
async function renewHash(
  { db, passwords }: ServiceDeps,
  account: AccountRecord,
  password: string,
): Promise<void> {
  if (passwords.isOutdated(account.passwordHash)) {
    await replacePasswordHash(db, account, await passwords.hash(password));
  }
}

interface Credentials {
  readonly email: string;
  readonly password: string;
}

/**
 * Checks a password, counted by the limits of signing in. Known and unknown addresses take the same way.
 * @throws RequestError 401 when they do not belong together.
 */
export async function checkCredentials(
  { db, clock, passwords }: ServiceDeps,
  credentials: Credentials,
  address: string,
): Promise<AccountRecord> {
  const email = normaliseEmail(credentials.email);
  await countTry(db, SIGN_IN_PER_ADDRESS, address, clock());
  const rules = { fromAddress: SIGN_IN_FROM_ADDRESS, inAll: SIGN_IN_PER_ACCOUNT };
  await countSharedTry(db, rules, email, address, clock());
  const account = await findAccountByEmail(db, email);
  const fits = await passwords.matches(credentials.password, account?.passwordHash ?? null);
  if (account === null || !fits) throw refused();
  await forgetTries(db, SIGN_IN_FROM_ADDRESS, placeOf(email, address));
  await forgetTries(db, SIGN_IN_PER_ACCOUNT, email);
  return account;
}

/** Checks who somebody says they are, and that the address was confirmed. */
export async function authenticate(
  deps: ServiceDeps,
  credentials: Credentials,
  address: string,
): Promise<Account> {
  const account = await checkCredentials(deps, credentials, address);
  if (account.confirmedAt === null) throw unconfirmed();
  await renewHash(deps, account, credentials.password);
  return account;
}
