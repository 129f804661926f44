import type { Logger } from 'pino';
import { createPasswords } from '#server/accounts/passwords';
import { openDb, openPool } from '#server/db/connection';
import { startPruning } from '#server/db/pruning';
import type { Deps } from '#server/deps';
import type { Env, Settings } from '#server/env';
import { startMailSender } from '#server/mail/mail-sender';
import { openTransport } from '#server/mail/transport';
import { createMeasurements } from '#server/measures/measurements';
import type { Closing } from '#server/setup/closing';
import type { Ground } from '#server/setup/ground';
import { startSummaries } from '#server/studies/summaries';

const clock = () => new Date();

/** A mail that is cut off is sent again after the next start. */
const MAIL_PATIENCE_MS = 2000;
/** A study that is cut off is summed up after the next start. */
const SUMMARY_PATIENCE_MS = 1000;

/** Puts together what one server process works with, in the order in which one needs the other. */
export function composeDeps(settings: Settings, ground: Ground, log: Logger, closing: Closing): Deps {
  const pool = openPool(ground.app);
  closing.add(() => pool.end());
  const db = openDb(pool);
  const env: Env = { ...settings, smtpUrl: ground.smtpUrl, sessionSecret: ground.sessionSecret };
  const passwords = createPasswords();
  closing.add(passwords.close);
  const measurements = createMeasurements();
  closing.add(measurements.close);
  const summaries = startSummaries({ db, log, measurements });
  closing.add(summaries.stop, SUMMARY_PATIENCE_MS);
  const transport = openTransport(ground.smtpUrl);
  const mailer = startMailSender({ db, log, clock, transport, mailFrom: env.mailFrom });
  closing.add(mailer.stop, MAIL_PATIENCE_MS);
  closing.add(startPruning({ db, log, clock }));
  return { env, db, pool, log, mailer, passwords, measurements, summaries, clock };
}
