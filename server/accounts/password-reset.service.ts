import type { requestPasswordReset, resetPassword } from '#shared/contracts/accounts';
import type { BodyOf } from '#shared/contracts/endpoint';
import {
  findAccount,
  findAccountByEmail,
  markConfirmed,
  setPasswordHash,
} from '#server/accounts/accounts.repository';
import { checkPassword, linkSpent } from '#server/accounts/accounts.service';
import { normaliseEmail } from '#server/accounts/email';
import { issueToken, peekToken, useToken } from '#server/accounts/tokens.repository';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import { LINK_PER_ADDRESS } from '#server/limits/limits.rules';
import { countMail, countTry } from '#server/limits/limits.service';
import { passwordResetLetter } from '#server/mail/letters';
import { putInOutbox } from '#server/mail/outbox.repository';
import { endSessionsOf } from '#server/sessions/sessions.repository';

export async function mailPasswordReset(
  deps: Deps,
  body: BodyOf<typeof requestPasswordReset>,
  address: string,
): Promise<void> {
  const email = normaliseEmail(body.email);
  const now = deps.clock();
  await countTry(deps.db, LINK_PER_ADDRESS, address, now);
  await countMail(deps.db, email, address, now);
  await inTransaction(deps.db, async (tx) => {
    const account = await findAccountByEmail(tx, email);
    if (account === null) return;
    const secret = await issueToken(tx, account.id, 'password-reset', now);
    await putInOutbox(tx, account, passwordResetLetter(deps.env.publicUrl, secret), now);
  });
  deps.mailer.kick();
}

/** Ends every session of the account. Whoever holds the link holds the mailbox, so the address counts as confirmed. */
export async function changePasswordByLink(deps: Deps, body: BodyOf<typeof resetPassword>): Promise<void> {
  const { db, clock, passwords } = deps;
  const holder = await peekToken(db, body.token, 'password-reset', clock());
  const person = holder === null ? null : await findAccount(db, holder);
  if (person === null) throw linkSpent();
  checkPassword(body.password, person);
  const passwordHash = await passwords.hash(body.password);
  await inTransaction(db, async (tx) => {
    const accountId = await useToken(tx, body.token, 'password-reset', clock());
    if (accountId === null) throw linkSpent();
    await setPasswordHash(tx, accountId, passwordHash);
    await markConfirmed(tx, accountId, clock());
    await endSessionsOf(tx, accountId, clock());
  });
}
