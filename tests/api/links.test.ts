import { expect, test } from 'vitest';
import { tokens } from '#server/db/schema/tokens';
import { createTestApp, type TestApp } from '../support/app';
import { enter, makeAccount, PASSWORD, somebody } from '../support/people';

const HOUR_MS = 60 * 60 * 1000;
const NEW_PASSWORD = 'five gold rings and more';

async function lastSecret(at: TestApp): Promise<string> {
  const mails = await at.mails();
  return /#([\w-]{22})/.exec(mails.at(-1)?.text ?? '')?.[1] ?? 'no secret';
}

async function askForReset(at: TestApp, email: string) {
  return somebody(at).send('POST', '/api/password-reset-requests', { email });
}

async function askForConfirmation(at: TestApp, email: string) {
  return somebody(at).send('POST', '/api/confirmation-requests', { email });
}

function reset(at: TestApp, token: string, password = NEW_PASSWORD) {
  return somebody(at).send('POST', '/api/password-resets', { token, password });
}

test('when a new password is set by the link, then every session ends and only the new one opens', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  await askForReset(at, ada.email);
  const answer = await reset(at, await lastSecret(at));
  expect(answer.status).toBe(200);
  expect((await ada.send('GET', '/api/session')).body.account).toBeNull();
  expect((await ada.send('GET', '/api/studies')).status).toBe(401);
  expect((await somebody(at).signIn(ada.email)).status).toBe(401);
  expect((await somebody(at).signIn(ada.email, NEW_PASSWORD)).status).toBe(200);
});

test('when the address is unknown, then the answers are the same and no mail goes out', async () => {
  const at = await createTestApp();
  const known = await makeAccount(at, { confirmed: false });
  for (const ask of [askForReset, askForConfirmation]) {
    const answer = await ask(at, 'nobody@people.example');
    const other = await ask(at, known.email);
    expect([answer.status, answer.body]).toEqual([other.status, other.body]);
  }
  expect((await at.mails()).map(({ to }) => to)).toEqual([known.email, known.email]);
});

test('when a link is used twice, then the second use is refused', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  await askForReset(at, email);
  const secret = await lastSecret(at);
  expect((await reset(at, secret)).status).toBe(200);
  const again = await reset(at, secret, 'yet another pass phrase');
  expect(again.status).toBe(410);
  expect(again.body.error.code).toBe('link.spent');
  expect((await somebody(at).signIn(email, NEW_PASSWORD)).status).toBe(200);
});

test('when a link is used by many at once, then one of them succeeds', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at, { confirmed: false });
  await askForConfirmation(at, email);
  const token = await lastSecret(at);
  const answers = await Promise.all(
    Array.from({ length: 6 }, () =>
      somebody(at).send('POST', '/api/confirmations', { token, password: PASSWORD }),
    ),
  );
  const statuses = answers.map(({ status }) => status).sort();
  expect(statuses).toEqual([200, 410, 410, 410, 410, 410]);
});

test('when a new link is asked for, then the earlier one is dead', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  await askForReset(at, email);
  const first = await lastSecret(at);
  at.advance(1000);
  await askForReset(at, email);
  expect((await reset(at, first)).status).toBe(410);
  expect((await reset(at, await lastSecret(at))).status).toBe(200);
});

test.each([
  ['a reset link', HOUR_MS, askForReset],
  ['a confirmation', 48 * HOUR_MS, askForConfirmation],
] as const)(
  'when %s is older than its time, then it is refused; a moment before, it is not',
  async (_what, life, ask) => {
    const at = await createTestApp();
    const { email } = await makeAccount(at, { confirmed: false });
    await ask(at, email);
    const token = await lastSecret(at);
    const use = () =>
      ask === askForReset
        ? reset(at, token)
        : somebody(at).send('POST', '/api/confirmations', { token, password: PASSWORD });
    at.advance(life);
    expect((await use()).status).toBe(410);
    at.advance(-1);
    expect((await use()).status).toBe(200);
  },
);

test('when the link is for something else, then it is refused', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at, { confirmed: false });
  await askForConfirmation(at, email);
  expect((await reset(at, await lastSecret(at))).status).toBe(410);
});

test('when the new password is too common, then the link stays good', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  await askForReset(at, email);
  const secret = await lastSecret(at);
  expect((await reset(at, secret, 'password123')).status).toBe(422);
  expect((await reset(at, secret)).status).toBe(200);
});

test.each([[0], [false], [[]], [{}], ['0'], [null], [undefined]])(
  'when the secret is %j, then it is no secret: 422',
  async (token) => {
    const at = await createTestApp();
    const { email } = await makeAccount(at, { confirmed: false });
    await askForConfirmation(at, email);
    expect(
      (await somebody(at).send('POST', '/api/confirmations', { token, password: PASSWORD })).status,
    ).toBe(422);
    expect(
      (await somebody(at).send('POST', '/api/password-resets', { token, password: PASSWORD })).status,
    ).toBe(422);
  },
);

test('when a mail scanner opens the page of a link, then the link is still good', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at, { confirmed: false });
  await askForConfirmation(at, email);
  const token = await lastSecret(at);
  await somebody(at).send('GET', '/confirm');
  await somebody(at).send('GET', `/api/confirmations?token=${token}`);
  expect((await somebody(at).send('POST', '/api/confirmations', { token, password: PASSWORD })).status).toBe(
    200,
  );
});

test('when the database is read, then it holds no secret that opens anything', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at, { confirmed: false });
  await askForConfirmation(at, email);
  const secret = await lastSecret(at);
  const [row] = await at.deps.db.select().from(tokens);
  expect(row?.digest).toHaveLength(32);
  expect(JSON.stringify(row)).not.toContain(secret);
  expect(row?.digest.includes(Buffer.from(secret))).toBe(false);
});

test('when Host and X-Forwarded-Host are forged, then the link leads home all the same', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  const visitor = somebody(at);
  const { csrfToken } = (await visitor.send('GET', '/api/session/csrf-token')).body;
  const headers = { 'x-csrf-token': csrfToken, host: 'evil.example', 'x-forwarded-host': 'evil.example' };
  await visitor.sendRaw('POST', '/api/password-reset-requests', headers, { email });
  const [mail] = await at.mails();
  expect(mail?.text).toContain('http://localhost:3000/reset-password#');
  expect(mail?.text).not.toContain('evil');
});
