import { insertAccount } from '#server/accounts/accounts.repository';
import { normaliseEmail } from '#server/accounts/email';
import { passwordFault } from '#server/accounts/password-rules';
import { randomSecret } from '#server/accounts/secrets';
import { insertOnce } from '#server/db/insert-once';
import type { Deps } from '#server/deps';
import { emailSchema, passwordSchema, personNameSchema } from '#shared/contracts/accounts';

interface NewAdministrator {
  readonly email: string;
  readonly name: string;
  readonly password: string;
}

/** A reason that the operator can mend; its message is all they need. */
export class CannotCreate extends Error {
  override readonly name = 'CannotCreate';
}

function faultsOf({ email, name, password }: NewAdministrator): string[] {
  const parsed = [emailSchema, personNameSchema, passwordSchema].map((schema, at) =>
    schema.safeParse([email, name, password][at]),
  );
  const faults = parsed.flatMap(({ error }) => error?.issues.map((issue) => issue.message) ?? []);
  const weak = passwordFault(password, { email, name });
  return weak === null ? faults : [...faults, weak];
}

/**
 * Makes an administrator; sign-up cannot. The operator vouches for the address, so no mail confirms it.
 * @throws CannotCreate with every fault, or when the address has an account already.
 */
export async function createAdministrator(
  { db, clock, passwords }: Pick<Deps, 'db' | 'clock' | 'passwords'>,
  administrator: NewAdministrator,
): Promise<void> {
  const faults = faultsOf(administrator);
  if (faults.length > 0) throw new CannotCreate(`That cannot be used: ${faults.join('; ')}.`);
  const email = normaliseEmail(administrator.email);
  const name = administrator.name.trim();
  const passwordHash = await passwords.hash(administrator.password);
  const now = clock();
  const id = randomSecret();
  const role = 'administrator';
  const account = { id, email, name, role, passwordHash, confirmedAt: now, createdAt: now } as const;
  if (!(await insertOnce(() => insertAccount(db, account)))) {
    throw new CannotCreate(`${email} has an account already.`);
  }
}
