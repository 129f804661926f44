import { asc } from 'drizzle-orm';
import type { Express } from 'express';
import { pino } from 'pino';
import supertest from 'supertest';
import { createPasswords } from '#server/accounts/passwords';
import { createApp } from '#server/app';
import { outbox } from '#server/db/schema/outbox';
import type { Deps } from '#server/deps';
import { readSettings } from '#server/env';
import { createMeasurements } from '#server/measures/measurements';
import { db, emptyTables, pool } from './database';

/** The lowest cost that bcrypt knows: the tests are about what is checked, not about how long it takes. */
const QUICK_COST = 4;
const passwords = createPasswords(QUICK_COST, 1);
const measurements = createMeasurements();
const SECRET = 'a secret for tests, long enough to be taken';

export interface TestApp {
  readonly app: Express;
  readonly deps: Deps;
  /** A browser of its own: it keeps its cookies. */
  browser(): ReturnType<typeof supertest.agent>;
  /** The mails put into the outbox so far; those of one moment in no order. */
  mails(): Promise<{ to: string; subject: string; text: string }[]>;
  /** Lets time pass for the program. */
  advance(ms: number): void;
}

/** The app over an empty database, with a clock that stands still until it is advanced. Settings as in the environment. */
export async function createTestApp(settings: Readonly<Record<string, string>> = {}): Promise<TestApp> {
  await emptyTables();
  let now = Date.now();
  const env = { ...readSettings(settings), smtpUrl: 'smtp://127.0.0.1:9', sessionSecret: SECRET };
  const deps: Deps = {
    env,
    db,
    pool,
    passwords,
    measurements,
    summaries: { kick: () => undefined, stop: () => Promise.resolve() },
    log: pino({ level: 'silent' }),
    clock: () => new Date(now),
    mailer: { kick: () => undefined, stop: () => Promise.resolve() },
  };
  const app = createApp(deps);
  return {
    app,
    deps,
    browser: () => supertest.agent(app),
    mails: () =>
      db
        .select({ to: outbox.toEmail, subject: outbox.subject, text: outbox.text })
        .from(outbox)
        .orderBy(asc(outbox.createdAt)),
    advance: (ms) => (now += ms),
  };
}
