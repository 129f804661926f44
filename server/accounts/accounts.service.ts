import type { BodyOf } from '#shared/contracts/endpoint';
import type { requestConfirmation, signUp } from '#shared/contracts/accounts';
import {
  findAccountByEmail,
  insertAccount,
  replaceUnconfirmed,
  type NewAccount,
} from '#server/accounts/accounts.repository';
import { normaliseEmail } from '#server/accounts/email';
import { passwordFault } from '#server/accounts/password-rules';
import { randomSecret } from '#server/accounts/secrets';
import { issueToken } from '#server/accounts/tokens.repository';
import type { Transaction } from '#server/db/connection';
import { insertOnce } from '#server/db/insert-once';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import { invalidInput, RequestError } from '#server/http/request-error';
import { LINK_PER_ADDRESS, SIGN_UP_PER_ADDRESS } from '#server/limits/limits.rules';
import { countMail, countTry } from '#server/limits/limits.service';
import { addressKnownLetter, confirmationLetter } from '#server/mail/letters';
import { putInOutbox, type Recipient } from '#server/mail/outbox.repository';

export function checkPassword(password: string, person: { name: string; email: string }): void {
  const fault = passwordFault(password, person);
  if (fault !== null) throw invalidInput([{ path: 'body.password', message: fault }]);
}

export function linkSpent(): RequestError {
  return new RequestError(
    410,
    'link.spent',
    'This link was used already, or it is too old. Ask for a new one.',
  );
}

type Addressee = Recipient & { readonly id: string };

async function sendConfirmation(deps: Deps, tx: Transaction, to: Addressee): Promise<void> {
  const now = deps.clock();
  const secret = await issueToken(tx, to.id, 'confirmation', now);
  await putInOutbox(tx, to, confirmationLetter(deps.env.publicUrl, secret), now);
}

/** A known address gets a mail of another kind; whoever signs up is told the same. */
async function register(deps: Deps, tx: Transaction, account: NewAccount): Promise<void> {
  if (await insertOnce(() => insertAccount(tx, account))) return sendConfirmation(deps, tx, account);
  const known = await findAccountByEmail(tx, account.email);
  if (known === null) return;
  if (known.confirmedAt !== null) {
    return putInOutbox(tx, known, addressKnownLetter(deps.env.publicUrl), deps.clock());
  }
  await replaceUnconfirmed(tx, account);
  await sendConfirmation(deps, tx, { id: known.id, name: account.name, email: account.email });
}

export async function registerAccount(
  deps: Deps,
  body: BodyOf<typeof signUp>,
  address: string,
): Promise<void> {
  const { db, clock, passwords, mailer } = deps;
  const email = normaliseEmail(body.email);
  checkPassword(body.password, { name: body.name, email });
  await countTry(db, SIGN_UP_PER_ADDRESS, address, clock());
  await countMail(db, email, address, clock());
  const passwordHash = await passwords.hash(body.password);
  const { name, role } = body;
  const account = {
    id: randomSecret(),
    email,
    name,
    role,
    passwordHash,
    confirmedAt: null,
    createdAt: clock(),
  };
  await inTransaction(db, (tx) => register(deps, tx, account));
  mailer.kick();
}

export async function mailConfirmation(
  deps: Deps,
  body: BodyOf<typeof requestConfirmation>,
  address: string,
): Promise<void> {
  const email = normaliseEmail(body.email);
  await countTry(deps.db, LINK_PER_ADDRESS, address, deps.clock());
  await countMail(deps.db, email, address, deps.clock());
  await inTransaction(deps.db, async (tx) => {
    const account = await findAccountByEmail(tx, email);
    if (account !== null && account.confirmedAt === null) await sendConfirmation(deps, tx, account);
  });
  deps.mailer.kick();
}
