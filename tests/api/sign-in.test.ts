import { expect, test } from 'vitest';
import { createTestApp, type TestApp } from '../support/app';
import { enter, makeAccount, PASSWORD, somebody } from '../support/people';

const SECOND_MS = 1000;

function cookieIn(answer: { headers: Record<string, unknown> }): string {
  return String(answer.headers['set-cookie'] ?? '');
}

async function wrongGuesses(at: TestApp, email: string, count: number): Promise<number[]> {
  const statuses: number[] = [];
  for (let guess = 0; guess < count; guess += 1) {
    statuses.push((await somebody(at).signIn(email, `guess number ${guess}`)).status);
  }
  return statuses;
}

test('when the address or the password is not right, then the answers are the same', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  const unknown = await somebody(at).signIn('nobody@people.example');
  const wrong = await somebody(at).signIn(email, 'not the pass phrase');
  expect(unknown.status).toBe(401);
  expect([unknown.status, unknown.body]).toEqual([wrong.status, wrong.body]);
});

test('when the account does not exist, then a hash is compared all the same', async () => {
  const at = await createTestApp();
  const compared: (string | null)[] = [];
  const { matches } = at.deps.passwords;
  Object.assign(at.deps, {
    passwords: {
      ...at.deps.passwords,
      matches: (password: string, hash: string | null) => {
        compared.push(hash);
        return matches(password, hash);
      },
    },
  });
  await somebody(at).signIn('nobody@people.example');
  expect(compared).toEqual([null]);
});

test('when somebody signs in, then the session has a new id and the one before is dead', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  const victim = somebody(at);
  const before = await victim.send('GET', '/api/session/csrf-token');
  const planted = cookieIn(before).split(';')[0] ?? '';
  const signedIn = await victim.sendRaw(
    'POST',
    '/api/session',
    { 'x-csrf-token': before.body.csrfToken },
    { email, password: PASSWORD },
  );
  expect(signedIn.status).toBe(200);
  expect(cookieIn(signedIn)).not.toContain(planted);
  const attacker = await somebody(at).sendRaw('GET', '/api/session', { cookie: planted });
  expect(attacker.body.account).toBeNull();
});

test('when a cookie is made up or signed by another key, then it opens nothing and is not taken over', async () => {
  const at = await createTestApp();
  const visitor = somebody(at);
  const cookie = 'siltline.sid.3000=s%3Amade-up.c2lnbmF0dXJl';
  const answer = await visitor.sendRaw('GET', '/api/session/csrf-token', { cookie });
  expect(cookieIn(answer)).toMatch(/^siltline\.sid\.3000=s%3A/);
  expect(cookieIn(answer)).not.toContain('made-up');
});

test('when served on http, then the cookie carries the port and is kept from scripts', async () => {
  const at = await createTestApp({ PORT: '3123' });
  const cookie = cookieIn(await somebody(at).send('GET', '/api/session/csrf-token'));
  expect(cookie).toMatch(/^siltline\.sid\.3123=/);
  expect(cookie).toContain('; HttpOnly');
  expect(cookie).toContain('; SameSite=Lax');
  expect(cookie).toContain('; Path=/');
  expect(cookie).not.toContain('Secure');
  expect(cookie).not.toContain('Domain');
});

const HTTPS = {
  DEMO: 'off',
  PUBLIC_URL: 'https://siltline.example',
  SMTP_URL: 'smtp://127.0.0.1:9',
  MAIL_FROM: 'siltline@siltline.example',
  TRUST_PROXY: '1',
};
const BEHIND_PROXY = { 'x-forwarded-proto': 'https' };

test('when served on https, then the cookie is bound to the host, at every answer', async () => {
  const at = await createTestApp(HTTPS);
  const { email } = await makeAccount(at);
  const person = somebody(at);
  const first = await person.sendRaw('GET', '/api/session/csrf-token', BEHIND_PROXY);
  const [sent = ''] = cookieIn(first).split(';');
  const headers = { ...BEHIND_PROXY, cookie: sent, 'x-csrf-token': first.body.csrfToken };
  const signedIn = await person.sendRaw('POST', '/api/session', headers, { email, password: PASSWORD });
  const [own = ''] = cookieIn(signedIn).split(';');
  const later = await person.sendRaw('GET', '/api/session', { ...BEHIND_PROXY, cookie: own });
  expect(later.body.account.email).toBe(email);
  for (const answer of [first, signedIn, later]) {
    expect(cookieIn(answer)).toMatch(/^__Host-siltline\.sid=/);
    expect(cookieIn(answer)).toContain('; Secure');
    expect(cookieIn(answer)).toContain('; HttpOnly');
    expect(cookieIn(answer)).toContain('; SameSite=Lax');
    expect(cookieIn(answer)).toContain('; Path=/');
  }
});

test('when https is expected but http comes, then the API refuses and a page is sent on', async () => {
  const at = await createTestApp(HTTPS);
  for (const path of ['/api/session', '/API/session']) {
    const api = await somebody(at).sendRaw('POST', path, {}, { email: 'a@x.example', password: PASSWORD });
    expect([api.status, api.body.error.code]).toEqual([403, 'https.required']);
  }
  const page = await somebody(at).send('GET', '/studies?tab=own');
  expect(page.status).toBe(308);
  expect(page.headers.location).toBe('https://siltline.example/studies?tab=own');
  for (const path of ['//evil.example/x', '/\\evil.example']) {
    const other = await somebody(at).send('GET', path);
    expect(String(other.headers.location ?? 'https://siltline.example/')).toMatch(
      /^https:\/\/siltline\.example\//,
    );
  }
});

test('when an account is guessed at, then the wait grows, is never a lock, and the right one passes after it', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  expect(await wrongGuesses(at, email, 6)).toEqual([401, 401, 401, 401, 401, 429]);
  const waits: number[] = [];
  for (let round = 0; round < 8; round += 1) {
    const refused = await somebody(at).signIn(email, 'a guess');
    expect(refused.status).toBe(429);
    waits.push(Number(refused.headers['retry-after']));
    at.advance(Number(refused.headers['retry-after']) * SECOND_MS);
    expect((await somebody(at).signIn(email, 'a guess')).status).toBe(401);
  }
  expect(waits).toEqual([2, 4, 8, 16, 32, 60, 60, 60]);
  at.advance(60 * SECOND_MS);
  expect((await somebody(at).signIn(email)).status).toBe(200);
  expect((await somebody(at).signIn(email)).status).toBe(200);
});

test('when many guesses come at once, then no more than the free ones are tried', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  const answers = await Promise.all(
    Array.from({ length: 20 }, (_, guess) => somebody(at).signIn(email, `guess ${guess}`)),
  );
  expect(answers.filter(({ status }) => status === 401)).toHaveLength(5);
  expect(answers.filter(({ status }) => status === 429)).toHaveLength(15);
});

test('when an unknown address is guessed at, then it is slowed just the same', async () => {
  const at = await createTestApp();
  expect(await wrongGuesses(at, 'nobody@people.example', 7)).toEqual([401, 401, 401, 401, 401, 429, 429]);
});

/** Somebody elsewhere: the proxy in front says from where. */
function elsewhere(at: TestApp, address: string) {
  const person = somebody(at);
  const send = async (path: string, body: object) => {
    const { csrfToken } = (await person.send('GET', '/api/session/csrf-token')).body;
    return person.sendRaw('POST', path, { 'x-csrf-token': csrfToken, 'x-forwarded-for': address }, body);
  };
  return {
    guess: (email: string, password: string) => send('/api/session', { email, password }),
    ask: (email: string) => send('/api/password-reset-requests', { email }),
  };
}

test('when a stranger elsewhere guesses at an account, then its owner does not wait', async () => {
  const at = await createTestApp({ TRUST_PROXY: '1' });
  const { email } = await makeAccount(at);
  const stranger = elsewhere(at, '198.51.100.7');
  const statuses: number[] = [];
  for (let n = 0; n < 7; n += 1) statuses.push((await stranger.guess(email, `guess ${n}`)).status);
  expect(statuses).toEqual([401, 401, 401, 401, 401, 429, 429]);
  expect((await elsewhere(at, '203.0.113.9').guess(email, PASSWORD)).status).toBe(200);
});

test('when many addresses guess at one account, then they are slowed together and the owner waits seconds', async () => {
  const at = await createTestApp({ TRUST_PROXY: '1' });
  const { email } = await makeAccount(at);
  for (let n = 0; n < 30; n += 1)
    expect((await elsewhere(at, `198.51.100.${n}`).guess(email, `guess ${n}`)).status).toBe(401);
  const slowed = await elsewhere(at, '198.51.100.200').guess(email, 'one more');
  expect(slowed.status).toBe(429);
  expect(slowed.body.error.details.retryAfterS).toBeLessThanOrEqual(8);
  at.advance(8 * SECOND_MS);
  expect((await elsewhere(at, '203.0.113.9').guess(email, PASSWORD)).status).toBe(200);
}, 60_000);

test('when a stranger elsewhere has mail sent to a mailbox, then its owner still gets theirs; all together stop at 20', async () => {
  const at = await createTestApp({ TRUST_PROXY: '1' });
  const { email } = await makeAccount(at);
  for (let n = 0; n < 6; n += 1) await elsewhere(at, '198.51.100.7').ask(email);
  expect(await at.mails()).toHaveLength(5);
  expect((await elsewhere(at, '203.0.113.9').ask(email)).status).toBe(200);
  for (let n = 0; n < 20; n += 1) await elsewhere(at, `192.0.2.${n}`).ask(email);
  expect(await at.mails()).toHaveLength(20);
});

test('when a class of 30 signs in within a minute from one address, then nobody waits', async () => {
  const at = await createTestApp();
  const people = await Promise.all(Array.from({ length: 30 }, () => makeAccount(at)));
  const statuses: number[] = [];
  for (const { email } of people) statuses.push((await somebody(at).signIn(email)).status);
  expect(statuses).toEqual(Array.from({ length: 30 }, () => 200));
}, 60_000);

test('when one address tries account after account, then it is slowed for the rest of the minute', async () => {
  const at = await createTestApp();
  const statuses: number[] = [];
  for (let n = 0; n < 61; n += 1) statuses.push((await somebody(at).signIn(`n${n}@people.example`)).status);
  expect(statuses.slice(0, 60).every((status) => status === 401)).toBe(true);
  expect(statuses[60]).toBe(429);
  at.advance(60 * SECOND_MS);
  expect((await somebody(at).signIn('other@people.example')).status).toBe(401);
}, 60_000);

test('when mail to one mailbox is asked for again and again, then it stops after five in an hour', async () => {
  const at = await createTestApp();
  const { email } = await makeAccount(at);
  const ask = () => somebody(at).send('POST', '/api/password-reset-requests', { email });
  const statuses: number[] = [];
  for (let n = 0; n < 6; n += 1) statuses.push((await ask()).status);
  expect(statuses).toEqual([200, 200, 200, 200, 200, 429]);
  expect(await at.mails()).toHaveLength(5);
  at.advance(60 * 60 * SECOND_MS);
  expect((await ask()).status).toBe(200);
});

test('when somebody signs out, then the cookie goes and a copy of it opens nothing', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const own = cookieIn(await ada.send('GET', '/api/session')).split(';')[0] ?? '';
  const out = await ada.send('DELETE', '/api/session');
  expect(out.status).toBe(200);
  expect(cookieIn(out)).toMatch(/^siltline\.sid\.3000=; Path=\/; Expires=Thu, 01 Jan 1970/);
  const copy = await somebody(at).sendRaw('GET', '/api/session', { cookie: own });
  expect(copy.body.account).toBeNull();
});
