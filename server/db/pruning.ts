import type { Logger } from 'pino';
import { pruneTokens } from '#server/accounts/tokens.repository';
import type { Db } from '#server/db/connection';
import { pruneDemoMails } from '#server/demo/mails.repository';
import { describeError } from '#server/http/describe-error';
import { pruneLimits } from '#server/limits/limits.service';
import { pruneSessions } from '#server/sessions/sessions.repository';
import { emptyTrash, thinSaves } from '#server/studies/thinning';

interface PruningDeps {
  readonly db: Db;
  readonly log: Logger;
  readonly clock: () => Date;
}

const EVERY_MS = 60 * 60 * 1000;

/**
 * Takes away what has expired: sessions, links, counters, deleted studies, saves between those that are kept, and the
 * demonstration's older mail.
 */
export async function prune({ db, clock }: Pick<PruningDeps, 'db' | 'clock'>): Promise<void> {
  const now = clock();
  await pruneSessions(db, now);
  await pruneTokens(db, now);
  await pruneLimits(db, now);
  await pruneDemoMails(db);
  await emptyTrash(db, now);
  await thinSaves(db, now);
}

/** Prunes now and every hour. @returns what stops it. */
export function startPruning(deps: PruningDeps): () => Promise<void> {
  const round = () =>
    prune(deps).catch((error: unknown) => {
      deps.log.warn({ fault: describeError(error) }, 'what has expired could not be taken away');
    });
  let running = round();
  const timer = setInterval(() => (running = round()), EVERY_MS);
  timer.unref();
  return async () => {
    clearInterval(timer);
    await running;
  };
}
