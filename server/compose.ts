import type { Logger } from 'pino';
import { createPasswords } from '#server/accounts/passwords';
import { openDb, openPool, type Db } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { startPruning } from '#server/db/pruning';
import { seedDemo } from '#server/demo/seed';
import type { Deps } from '#server/deps';
import type { Env, Settings } from '#server/env';
import { startFakeSmtp } from '#server/mail/fake-smtp';
import { startMailSender } from '#server/mail/mail-sender';
import { openTransport } from '#server/mail/transport';
import { createMeasurements } from '#server/measures/measurements';
import type { Closing } from '#server/setup/closing';
import { openDatabase } from '#server/setup/database';
import { migrateDatabase } from '#server/setup/migration';
import { startSummaries } from '#server/studies/summaries';

const clock = () => new Date();

/** A mail that is cut off is sent again after the next start. */
const MAIL_PATIENCE_MS = 2000;
/** A study that is cut off is summed up after the next start. */
const SUMMARY_PATIENCE_MS = 1000;

/** Puts together what the program works with, in the order in which one needs the other. */
export async function composeDeps(settings: Settings, log: Logger, closing: Closing): Promise<Deps> {
  const database = await openDatabase(settings, log);
  closing.add(database.stop);
  await migrateDatabase(database.migration);
  const pool = openPool(database.app);
  closing.add(() => pool.end());
  const db = openDb(pool);
  const smtpUrl = settings.smtpUrl ?? (await startDemoMail(db, closing));
  const env: Env = { ...settings, smtpUrl, sessionSecret: database.sessionSecret };
  const passwords = createPasswords();
  closing.add(passwords.close);
  const measurements = createMeasurements();
  closing.add(measurements.close);
  const summaries = startSummaries({ db, log, measurements });
  closing.add(summaries.stop, SUMMARY_PATIENCE_MS);
  const transport = openTransport(smtpUrl);
  const mailer = startMailSender({ db, log, clock, transport, mailFrom: env.mailFrom });
  closing.add(mailer.stop, MAIL_PATIENCE_MS);
  closing.add(startPruning({ db, log, clock }));
  const deps: Deps = { env, db, pool, log, mailer, passwords, measurements, summaries, clock };
  if (env.mode === 'demo' && (await isEmpty(db))) await seedDemo(deps);
  summaries.kick();
  return deps;
}

/** In the demo mail is sent as it would be, but to a server that shows it and delivers nothing. */
async function startDemoMail(db: Db, closing: Closing): Promise<string> {
  const { url, close } = await startFakeSmtp(db, clock);
  closing.add(close);
  return url;
}

async function isEmpty(db: Db): Promise<boolean> {
  const anybody = await db.select({ id: accounts.id }).from(accounts).limit(1);
  return anybody.length === 0;
}
