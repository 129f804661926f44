import { Writable } from 'node:stream';
import { eq, sql } from 'drizzle-orm';
import { pino, type Logger } from 'pino';
import supertest from 'supertest';
import { expect, onTestFinished, test } from 'vitest';
import { createApp } from '#server/app';
import { openDb, openPool } from '#server/db/connection';
import { accounts } from '#server/db/schema/accounts';
import { studies } from '#server/db/schema/studies';
import { inTransaction } from '#server/db/transaction';
import { findStudy } from '#server/studies/studies.repository';
import { createTestApp, type TestApp } from '../support/app';
import { enter, makeAccount, PASSWORD, somebody } from '../support/people';
import { documentOf, makeStudy, saveOf } from '../support/studies';

const SECRETS = { email: 'very.private@people.example', password: 'a very private pass phrase' };

/** All that is logged while it works. */
function listen(): { log: Logger; text: () => string } {
  let text = '';
  const stream = new Writable({
    write: (part, _encoding, done) => {
      text += String(part);
      done();
    },
  });
  return { log: pino({ level: 'trace' }, stream), text: () => text };
}

test('when the database is away, then every request that needs it is told so and nothing is leaked', async () => {
  const { deps } = await createTestApp();
  const pool = openPool({ user: 'nobody', password: 'x', database: 'none', socketPath: '/nowhere/db' });
  onTestFinished(() => pool.end());
  const app = createApp({ ...deps, pool, db: openDb(pool) });
  for (const path of ['/api/session/csrf-token', '/api/session', '/api/studies', '/api/demo/mails']) {
    // A cookie, so that the session must be looked for.
    const answer = await supertest(app).get(path).set('cookie', 'siltline.sid.3000=s%3Ax.y');
    if (answer.status === 200 || answer.status === 401) continue;
    expect([answer.status, answer.body.error.code]).toEqual([503, 'database.away']);
    expect(Number(answer.headers['retry-after'])).toBeGreaterThan(0);
    expect(JSON.stringify(answer.body)).not.toMatch(/nobody|nowhere|select|ENOENT/);
  }
  const mails = await supertest(app).get('/api/demo/mails');
  expect(mails.status).toBe(503);
});

test('when the database goes away while somebody saves, then they are told and nothing is half done', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const { transaction } = at.deps.db;
  Object.assign(at.deps.db, {
    transaction: () =>
      Promise.reject(
        Object.assign(new Error('read ECONNRESET'), { code: 'ECONNRESET', errno: -104, fatal: true }),
      ),
  });
  onTestFinished(() => void Object.assign(at.deps.db, { transaction }));
  const body = saveOf(documentOf('Kept at home'), 1);
  const refused = await ada.send('PUT', `/api/studies/${id}`, body);
  expect([refused.status, refused.body.error.code]).toEqual([503, 'database.away']);
  Object.assign(at.deps.db, { transaction });
  expect((await ada.send('PUT', `/api/studies/${id}`, body)).body.number).toBe(2);
});

test('when a statement fails in mid-transaction, then nothing of it stays', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const failing = inTransaction(at.deps.db, async (tx) => {
    await tx.update(studies).set({ newestNumber: 7 }).where(eq(studies.id, id));
    await tx.execute(sql`select no_such_column from studies`);
  });
  await expect(failing).rejects.toThrow();
  const viewer = { id: ada.id, email: ada.email, name: ada.name, role: 'composer' } as const;
  expect((await findStudy(at.deps.db, viewer, id)).number).toBe(1);
});

async function twoAccounts(at: TestApp): Promise<[string, string]> {
  return [(await makeAccount(at)).id, (await makeAccount(at)).id];
}

test('when two transactions lock each other out, then the loser runs again, whole, and both are done', async () => {
  const at = await createTestApp();
  const { db } = at.deps;
  const [one, two] = await twoAccounts(at);
  let runs = 0;
  let arrived = 0;
  let open: () => void = () => undefined;
  const both = new Promise<void>((resolve) => (open = resolve));
  const write = (first: string, second: string, mark: string) =>
    inTransaction(db, async (tx) => {
      runs += 1;
      const append = (id: string) =>
        tx
          .update(accounts)
          .set({ name: sql`concat(${accounts.name}, ${mark})` })
          .where(eq(accounts.id, id));
      await append(first);
      // Only once each holds what the other needs do they go on.
      arrived += 1;
      if (arrived === 2) open();
      await both;
      await append(second);
    });
  await Promise.all([write(one, two, '+a'), write(two, one, '+b')]);
  expect(runs).toBe(3);
  const names = await db.select({ name: accounts.name }).from(accounts);
  for (const { name } of names)
    expect([...name.matchAll(/\+[ab]/g)].map(String).sort()).toEqual(['+a', '+b']);
});

test('when a row is locked for long, then a save is told so within ten seconds and changes nothing', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const holder = await at.deps.pool.getConnection();
  await holder.query('begin');
  await holder.query('select * from studies where id = ? for update', [id]);
  const began = performance.now();
  const body = saveOf(documentOf('Waiting'), 1);
  const refused = await ada.send('PUT', `/api/studies/${id}`, body);
  expect([refused.status, refused.body.error.code]).toEqual([503, 'database.away']);
  expect(performance.now() - began).toBeLessThan(10_000);
  await holder.query('rollback');
  holder.release();
  expect((await ada.send('PUT', `/api/studies/${id}`, body)).body.number).toBe(2);
}, 30_000);

test('when all goes well and when all goes wrong, then no secret is logged', async () => {
  const at = await createTestApp();
  const { log, text } = listen();
  const app = createApp({ ...at.deps, log });
  const person = somebody({ browser: () => supertest.agent(app) });
  await makeAccount(at, { email: SECRETS.email });
  const token = (await person.send('GET', '/api/session/csrf-token')).body.csrfToken;
  await person.send('POST', '/api/session', SECRETS);
  await person.signIn(SECRETS.email);
  await person.send('POST', '/api/accounts', { ...SECRETS, name: 'N', role: 'student' });
  await person.send('POST', '/api/password-reset-requests', { email: SECRETS.email });
  await person.send('POST', '/api/confirmations', { token: 'SECRETSECRETSECRETSECR', password: 'x' });
  await person.send('GET', '/api/session?token=SECRETSECRETSECRETSECR');
  const broken = { ...at.deps, log, db: openDb(at.deps.pool) };
  Object.assign(broken.db, {
    select: () => {
      throw Object.assign(new Error(`Failed query: select\nparams: ${SECRETS.email}`), {
        name: 'DrizzleQueryError',
        query: 'select',
        params: [SECRETS.email],
        cause: Object.assign(new Error(`Duplicate entry '${SECRETS.email}'`), {
          code: 'ER_X',
          errno: 1,
          sqlState: 'HY000',
        }),
      });
    },
  });
  const failed = await supertest(createApp(broken)).get('/api/demo/mails');
  expect([failed.status, failed.body.error.code]).toEqual([500, 'server.failed']);
  expect(failed.body.error.message).toContain(failed.headers['x-request-id']);
  expect(JSON.stringify(failed.body)).not.toMatch(/select|params|private/);
  const logged = text();
  expect(logged).toContain('"signed in"');
  expect(logged).toContain('ER_X');
  for (const secret of [
    SECRETS.email,
    SECRETS.password,
    PASSWORD,
    token,
    'siltline.sid',
    'SECRETSECRET',
    'set-cookie',
  ]) {
    expect(logged).not.toContain(secret);
  }
});

test('when an address carries control characters, then the log stays in its lines', async () => {
  const at = await createTestApp();
  const { log, text } = listen();
  await supertest(createApp({ ...at.deps, log })).get('/api/%0a%7b%22level%22%3a60%7d%e2%80%ae');
  const lines = text().trim().split('\n');
  for (const line of lines) expect(JSON.parse(line)).toMatchObject({ level: expect.any(Number) });
  expect(text()).not.toContain('\u202e');
});
