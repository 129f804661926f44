import { eq } from 'drizzle-orm';
import 'csrf-sync';
import type { SessionData } from 'express-session';
import { expect, test } from 'vitest';
import { accounts } from '#server/db/schema/accounts';
import { sessions } from '#server/db/schema/sessions';
import { prune } from '#server/db/pruning';
import { SessionStore } from '#server/sessions/session.store';
import { createTestApp, type TestApp } from '../support/app';
import { enter, makeAccount } from '../support/people';

const DAY_MS = 24 * 60 * 60 * 1000;

function storeOf({ deps }: TestApp): SessionStore {
  return new SessionStore(deps.db, deps.clock, { path: '/', secure: true });
}

function done(work: (finish: (error?: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => work((error) => (error ? reject(error) : resolve())));
}

function get(store: SessionStore, sid: string): Promise<SessionData | null> {
  return new Promise((resolve, reject) =>
    store.get(sid, (error, data) => (error ? reject(error) : resolve(data ?? null))),
  );
}

function dataOf(accountId: string | undefined): SessionData {
  return { cookie: { originalMaxAge: DAY_MS }, accountId, csrfToken: 'token' };
}

test('when a session is kept, then it comes back with the cookie settings in force', async () => {
  const at = await createTestApp();
  const { id } = await makeAccount(at);
  const store = storeOf(at);
  await done((finish) => store.set('sid', dataOf(id), finish));
  expect(await get(store, 'sid')).toMatchObject({
    accountId: id,
    csrfToken: 'token',
    cookie: { path: '/', secure: true },
  });
  expect(await get(store, 'other')).toBeNull();
});

test('when a slow request keeps or touches a session after it was ended, then it stays ended', async () => {
  const at = await createTestApp();
  const { id } = await makeAccount(at);
  const store = storeOf(at);
  await done((finish) => store.set('sid', dataOf(id), finish));
  await done((finish) => store.destroy('sid', finish));
  await done((finish) => store.set('sid', dataOf(id), finish));
  await done((finish) => store.touch('sid', dataOf(id), finish));
  expect(await get(store, 'sid')).toBeNull();
  const [row] = await at.deps.db.select({ data: sessions.data }).from(sessions);
  expect(row?.data).toBe('{}');
});

test('when a session is not used for seven days, then it is over; used in between, it goes on', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  at.advance(6 * DAY_MS);
  expect((await ada.send('GET', '/api/session')).body.account?.id).toBe(ada.id);
  at.advance(6 * DAY_MS);
  expect((await ada.send('GET', '/api/session')).body.account?.id).toBe(ada.id);
  at.advance(7 * DAY_MS);
  expect((await ada.send('GET', '/api/session')).body.account).toBeNull();
});

test('when a session is used every day, then it is over after thirty', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  for (let day = 1; day < 30; day += 1) {
    at.advance(DAY_MS);
    expect((await ada.send('GET', '/api/session')).body.account?.id).toBe(ada.id);
  }
  at.advance(DAY_MS);
  expect((await ada.send('GET', '/api/session')).body.account).toBeNull();
});

test('when a role is changed, then it holds from the next request on', async () => {
  const at = await createTestApp();
  const ada = await enter(at, { role: 'administrator' });
  expect((await ada.send('GET', '/api/studies')).status).toBe(403);
  await at.deps.db.update(accounts).set({ role: 'teacher' }).where(eq(accounts.id, ada.id));
  expect((await ada.send('GET', '/api/studies')).status).toBe(200);
});

test('when an account is gone, then its sessions open nothing', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  await at.deps.db.delete(accounts).where(eq(accounts.id, ada.id));
  expect((await ada.send('GET', '/api/session')).body.account).toBeNull();
});

test('when what has expired is taken away, then what lasts stays', async () => {
  const at = await createTestApp();
  await enter(at);
  at.advance(8 * DAY_MS);
  const ben = await enter(at);
  await prune(at.deps);
  expect(
    await at.deps.db.select({ user: sessions.userId }).from(sessions).where(eq(sessions.userId, ben.id)),
  ).toHaveLength(1);
  expect(
    (await at.deps.db.select({ user: sessions.userId }).from(sessions)).every(
      ({ user }) => user === null || user === ben.id,
    ),
  ).toBe(true);
});

test('when visitors only look, then no session is kept for them', async () => {
  const at = await createTestApp();
  await at.browser().get('/api/session');
  await at.browser().get('/api/demo/people');
  expect(await at.deps.db.select({ id: sessions.id }).from(sessions)).toEqual([]);
});
