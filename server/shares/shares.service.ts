import type { Share } from '#shared/contracts/shares';
import { normaliseEmail } from '#server/accounts/email';
import { randomSecret } from '#server/accounts/secrets';
import type { Transaction } from '#server/db/connection';
import { insertOnce } from '#server/db/insert-once';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { invalidInput, RequestError } from '#server/http/request-error';
import { SHARES_PER_MAILBOX, SHARES_PER_PERSON } from '#server/limits/limits.rules';
import { countTry } from '#server/limits/limits.service';
import { sharedStudyLetter } from '#server/mail/letters';
import { putInOutbox } from '#server/mail/outbox.repository';
import { changeShare, insertShare, removeShare } from '#server/shares/shares.repository';
import { accessStudy, lockStudy } from '#server/studies/studies.access';
import { findStudy } from '#server/studies/studies.repository';

type ShareDeps = Pick<Deps, 'db' | 'clock' | 'mailer' | 'env'>;

export function unknownShare(): RequestError {
  return new RequestError(404, 'share.unknown', 'The study is not shared like that any more.');
}

async function tell(
  { env, clock }: ShareDeps,
  tx: Transaction,
  sharer: Viewer,
  studyId: string,
  share: Pick<Share, 'email' | 'may'>,
): Promise<void> {
  const { document } = await findStudy(tx, sharer, studyId);
  const shared = { sharerName: sharer.name, title: document.title, studyId, may: share.may };
  // Whether the address has an account, and under which name, is not the sharer's to learn.
  await putInOutbox(tx, { name: '', email: share.email }, sharedStudyLetter(env.publicUrl, shared), clock());
}

/** Sharing again with the same address changes what it may; only the first time is told by mail. */
export async function share(
  deps: ShareDeps,
  viewer: Viewer,
  studyId: string,
  body: Pick<Share, 'email' | 'may'>,
): Promise<Share> {
  const { db, clock, mailer } = deps;
  const email = normaliseEmail(body.email);
  await accessStudy(db, viewer, studyId, 'share');
  if (email === viewer.email)
    throw invalidInput([{ path: 'body.email', message: 'this is your own address' }]);
  await countTry(db, SHARES_PER_PERSON, viewer.id, clock());
  await countTry(db, SHARES_PER_MAILBOX, `${viewer.id} ${email}`, clock());
  const made = await inTransaction(db, async (tx) => {
    await lockStudy(tx, viewer, studyId, 'share');
    const row = { id: randomSecret(), studyId, email, may: body.may, sharedAt: clock() };
    if (await insertOnce(() => insertShare(tx, row))) await tell(deps, tx, viewer, studyId, row);
    return changeShare(tx, studyId, email, body.may);
  });
  if (made === null) throw unknownShare();
  mailer.kick();
  return made;
}

export async function unshare(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  studyId: string,
  shareId: string,
): Promise<void> {
  await inTransaction(db, async (tx) => {
    await lockStudy(tx, viewer, studyId, 'share');
    if (!(await removeShare(tx, studyId, shareId))) throw unknownShare();
  });
}
