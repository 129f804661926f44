import { afterAll, expect, test } from 'vitest';
import { createPasswordWorkers } from '#server/accounts/password-workers';
import { createPasswords, PASSWORD_COST } from '#server/accounts/passwords';

const LOWEST_COST = 4;
const passwords = createPasswords(LOWEST_COST, 1);
afterAll(() => passwords.close());

test('when a password is hashed, then it fits and no other does', async () => {
  const hash = await passwords.hash('slack water');
  expect(hash).toMatch(/^\$2b\$04\$/);
  expect(await passwords.matches('slack water', hash)).toBe(true);
  expect(await passwords.matches('slack wate', hash)).toBe(false);
});

test('when passwords differ behind byte 72 or behind a NUL, then they differ', async () => {
  const long = '🎻'.repeat(64);
  const hash = await passwords.hash(`${long}a`);
  expect(await passwords.matches(`${long}b`, hash)).toBe(false);
  expect(await passwords.matches(`${long}a`, hash)).toBe(true);
  expect(await passwords.matches('a\u0000c', await passwords.hash('a\u0000b'))).toBe(false);
});

test('when there is no account, then the answer is no, whatever the password', async () => {
  expect(await passwords.matches('anything', null)).toBe(false);
});

test('when the workers were too busy for an unknown account, then the next unknown account is answered', async () => {
  const crowded = createPasswords(LOWEST_COST, 1);
  const waiting = Promise.allSettled(Array.from({ length: 80 }, () => crowded.hash('x')));
  await expect(crowded.matches('anything', null)).rejects.toMatchObject({ code: 'server.busy' });
  await waiting;
  expect(await crowded.matches('anything', null)).toBe(false);
  await crowded.close();
});

test('when a hash was made at another cost, then it is outdated', async () => {
  expect(passwords.isOutdated(await passwords.hash('x'))).toBe(false);
  expect(passwords.isOutdated('$2b$10$abcdefghijklmnopqrstuuAJ5h1nTRZZFqMvQrnqpEWbpjPVJyTM2')).toBe(true);
});

test('when the cost in force is looked at, then it is no less than OWASP asks', () => {
  // OWASP Password Storage Cheat Sheet: bcrypt with a work factor of 10 or more.
  expect(PASSWORD_COST).toBeGreaterThanOrEqual(10);
});

test('when hashing goes on, then the event loop stays free', async () => {
  const busy = createPasswords(11, 1);
  await busy.hash('warm');
  let turns = 0;
  const timer = setInterval(() => (turns += 1), 1);
  await busy.hash('slow enough to notice');
  clearInterval(timer);
  await busy.close();
  expect(turns).toBeGreaterThan(10);
});

test('when too many wait, then the next is told to come back', async () => {
  const workers = createPasswordWorkers(1);
  const job = { kind: 'hash', password: 'x', cost: LOWEST_COST } as const;
  const answers = await Promise.allSettled(Array.from({ length: 80 }, () => workers.run(job)));
  await workers.close();
  const refused = answers.filter(({ status }) => status === 'rejected');
  expect(refused.length).toBeGreaterThan(0);
  for (const answer of refused)
    expect(answer).toMatchObject({ reason: { status: 503, code: 'server.busy' } });
  expect(answers.filter(({ status }) => status === 'fulfilled').length).toBeGreaterThanOrEqual(60);
});

test('when a job fails in the worker, then it is told and the next job is done all the same', async () => {
  const workers = createPasswordWorkers(1);
  const withoutPassword = JSON.parse('{ "kind": "hash", "cost": 4 }');
  await expect(workers.run(withoutPassword)).rejects.toThrow();
  expect(await workers.run({ kind: 'hash', password: 'x', cost: LOWEST_COST })).toMatch(/^\$2b\$04\$/);
  await workers.close();
});
