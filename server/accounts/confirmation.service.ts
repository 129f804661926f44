import type { Account, confirmAccount } from '#shared/contracts/accounts';
import type { BodyOf } from '#shared/contracts/endpoint';
import { findAccountById, markConfirmed } from '#server/accounts/accounts.repository';
import { linkSpent } from '#server/accounts/accounts.service';
import { peekToken, useToken } from '#server/accounts/tokens.repository';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import { checkCredentials } from '#server/sessions/sessions.service';

/**
 * The link shows that somebody holds the mailbox, the password that they are who signed up: an account that a
 * stranger made under this address, with a password that the stranger knows, is not confirmed by its holder.
 * @returns whose account it is, to be signed in.
 * @throws RequestError 410 when the link is spent, 401 when the password is another; the link then stays good.
 */
export async function confirm(
  deps: Deps,
  { token, password }: BodyOf<typeof confirmAccount>,
  address: string,
): Promise<Account> {
  const { db, clock } = deps;
  const holder = await peekToken(db, token, 'confirmation', clock());
  const person = holder === null ? null : await findAccountById(db, holder);
  if (person === null) throw linkSpent();
  const checked = await checkCredentials(deps, { email: person.email, password }, address);
  return inTransaction(db, async (tx) => {
    const used = await useToken(tx, token, 'confirmation', clock());
    const now = used === null ? null : await findAccountById(tx, used);
    // Somebody signed up anew while the password was being checked: it is no longer the one that counts.
    if (now === null || now.passwordHash !== checked.passwordHash) throw linkSpent();
    await markConfirmed(tx, now.id, clock());
    return now;
  });
}
