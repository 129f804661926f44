import type { Logger } from 'pino';
import { z } from 'zod';
import { createPasswords } from '#server/accounts/passwords';
import { openDb, openPool, type Db } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { seedDemo } from '#server/demo/seed';
import type { Settings } from '#server/env';
import { startFakeSmtp } from '#server/mail/fake-smtp';
import type { Closing } from '#server/setup/closing';
import { openDatabase } from '#server/setup/database';
import { migrateDatabase } from '#server/setup/migration';

/** What all server processes of one start stand on; it can be sent from one process to another. */
export const groundSchema = z.object({
  app: z.object({
    user: z.string(),
    password: z.string(),
    database: z.string(),
    socketPath: z.string().optional(),
    host: z.string().optional(),
    port: z.number().optional(),
  }),
  smtpUrl: z.string(),
  sessionSecret: z.string(),
});
export type Ground = Readonly<z.infer<typeof groundSchema>>;

const clock = () => new Date();

/** The database, up to date and, in the demo, filled, and where mail goes. Made once, however many processes serve. */
export async function layGround(settings: Settings, log: Logger, closing: Closing): Promise<Ground> {
  const database = await openDatabase(settings, log);
  closing.add(database.stop);
  await migrateDatabase(database.migration);
  const { app, sessionSecret } = database;
  if (settings.smtpUrl !== undefined) return { app, sessionSecret, smtpUrl: settings.smtpUrl };
  const pool = openPool(app);
  closing.add(() => pool.end());
  const db = openDb(pool);
  await fillDemo(db, log);
  // In the demo mail is sent as it would be, but to a server that shows it and delivers nothing.
  const { url, close } = await startFakeSmtp(db, clock);
  closing.add(close);
  return { app, sessionSecret, smtpUrl: url };
}

async function fillDemo(db: Db, log: Logger): Promise<void> {
  const anybody = await db.select({ id: accounts.id }).from(accounts).limit(1);
  if (anybody.length > 0) return;
  const passwords = createPasswords();
  try {
    await seedDemo({ db, passwords, clock, log });
  } finally {
    await passwords.close();
  }
}
