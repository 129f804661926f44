import { expect, test } from 'vitest';
import { accounts } from '#server/db/schema/accounts';
import { createTestApp, type TestApp } from '../support/app';
import { makeAccount, PASSWORD, somebody, type Somebody } from '../support/people';

const ADA = { email: 'ada@people.example', name: 'Ada', password: PASSWORD, role: 'student' };

function signUp(at: TestApp, changes: object = {}) {
  return somebody(at).send('POST', '/api/accounts', { ...ADA, ...changes });
}

function secretIn(text: string | undefined): string {
  return /#([\w-]{22})/.exec(text ?? '')?.[1] ?? 'no secret';
}

function confirm(who: Somebody, text: string | undefined, password = PASSWORD) {
  return who.send('POST', '/api/confirmations', { token: secretIn(text), password });
}

test('when somebody signs up and confirms by the link and their password, then they are signed in', async () => {
  const at = await createTestApp();
  expect((await signUp(at)).status).toBe(200);
  expect((await somebody(at).signIn(ADA.email)).body.error.code).toBe('account.unconfirmed');

  const [mail] = await at.mails();
  expect(mail?.to).toBe('ada@people.example');
  expect(mail?.text).toContain('http://localhost:3000/confirm#');
  const ada = somebody(at);
  const confirmed = await confirm(ada, mail?.text);
  const account = { id: expect.any(String), name: 'Ada', email: 'ada@people.example', role: 'student' };
  expect(confirmed.body).toEqual({ account });
  expect((await ada.send('GET', '/api/session')).body.account).toEqual(account);
  expect((await somebody(at).signIn(ADA.email)).body).toEqual({ account });
});

test('when a stranger signed up with somebody’s address, then its holder confirms nothing without that password', async () => {
  const at = await createTestApp();
  await signUp(at, { name: 'Mallory', password: 'planted before her' });
  const [mail] = await at.mails();
  const holder = somebody(at);
  const refused = await confirm(holder, mail?.text, PASSWORD);
  expect([refused.status, refused.body]).toEqual([401, (await somebody(at).signIn(ADA.email)).body]);
  expect((await holder.send('GET', '/api/session')).body.account).toBeNull();
  const mallory = await somebody(at).signIn(ADA.email, 'planted before her');
  expect(mallory.body.error.code).toBe('account.unconfirmed');
});

test('when passwords are guessed at by a link, then the guesses are slowed as at signing in and the link stays good', async () => {
  const at = await createTestApp();
  await signUp(at);
  const [mail] = await at.mails();
  const statuses: number[] = [];
  for (let guess = 0; guess < 6; guess += 1)
    statuses.push((await confirm(somebody(at), mail?.text, `guess number ${guess}`)).status);
  expect(statuses).toEqual([401, 401, 401, 401, 401, 429]);
  at.advance(60 * 1000);
  expect((await confirm(somebody(at), mail?.text)).status).toBe(200);
});

test('when the address has an account already, then the answer is the same and the mail says so', async () => {
  const at = await createTestApp();
  await makeAccount(at, { email: 'known@people.example' });
  const unknown = await signUp(at);
  const known = await signUp(at, {
    email: 'Known@People.example',
    name: 'Mallory',
    password: 'another pass phrase',
  });
  expect(known.status).toBe(unknown.status);
  expect(known.body).toEqual(unknown.body);

  const mail = (await at.mails()).find(({ to }) => to === 'known@people.example');
  expect(mail?.subject).toBe('You have an account already');
  expect(mail?.text).not.toContain('#');
  expect((await somebody(at).signIn('known@people.example', 'another pass phrase')).status).toBe(401);
  expect((await somebody(at).signIn('known@people.example')).body.account.name).toBe('Somebody');
});

test('when an unconfirmed address signs up again, then the newer sign-up and its link alone count', async () => {
  const at = await createTestApp();
  await signUp(at, { name: 'Mallory', password: 'planted before her' });
  const [first] = await at.mails();
  at.advance(1000);
  await signUp(at);
  const [, second] = await at.mails();

  const old = await confirm(somebody(at), first?.text, 'planted before her');
  expect(old.body.error.code).toBe('link.spent');
  expect((await confirm(somebody(at), second?.text, 'planted before her')).status).toBe(401);
  expect((await confirm(somebody(at), second?.text)).status).toBe(200);
  expect((await somebody(at).signIn(ADA.email, 'planted before her')).status).toBe(401);
  expect((await somebody(at).signIn(ADA.email)).body.account.name).toBe('Ada');
});

test('when two sign up with one address at once, then there is one account', async () => {
  const at = await createTestApp();
  const answers = await Promise.all([
    signUp(at),
    signUp(at, { name: 'Ada too' }),
    signUp(at, { name: 'Ada three' }),
  ]);
  expect(answers.map(({ status }) => status)).toEqual([200, 200, 200]);
  expect(await at.deps.db.select({ id: accounts.id }).from(accounts)).toHaveLength(1);
});

test('when an address is written in capitals or with space around it, then it is the same address', async () => {
  const at = await createTestApp();
  await signUp(at, { email: ' ADA@people.EXAMPLE ' });
  expect((await at.mails())[0]?.to).toBe('ada@people.example');
  await signUp(at);
  expect(await at.deps.db.select({ email: accounts.email }).from(accounts)).toEqual([
    { email: 'ada@people.example' },
  ]);
});

test('when two addresses differ by an accent or by padding, then the database keeps them apart', async () => {
  const at = await createTestApp();
  for (const email of ['a@x.example', 'á@x.example', 'a@x.example ']) await makeAccount(at, { email });
  await expect(makeAccount(at, { email: 'a@x.example' })).rejects.toThrow();
  expect(await at.deps.db.select({ id: accounts.id }).from(accounts)).toHaveLength(3);
});

test('when somebody asks to be an administrator, or brings fields of their own, then each is named', async () => {
  const at = await createTestApp();
  const answer = await signUp(at, { role: 'administrator', confirmedAt: '2020-01-01', email: 'no address' });
  expect(answer.status).toBe(422);
  expect(answer.body.error.code).toBe('input.invalid');
  const paths = answer.body.error.details.map(({ path }: { path: string }) => path);
  expect(paths).toEqual(expect.arrayContaining(['body.role', 'body.email', 'body']));
});

test.each([
  ['password1', 'among the first that are tried'],
  ['Dragon12345!', 'among the first that are tried'],
  ['aaaaaaaaaaaa', 'more different characters'],
  ['Sandpiper1', 'your own name'],
  ['ilovesiltline', 'name of this program'],
  ['short', 'at least 8'],
])('when the password is %s, then the field says why not', async (password, why) => {
  const at = await createTestApp();
  const answer = await signUp(at, { name: 'Ada Sandpiper', password });
  expect(answer.status).toBe(422);
  expect(answer.body.error.details).toEqual([
    { path: 'body.password', message: expect.stringContaining(why) },
  ]);
  expect(await at.mails()).toEqual([]);
});

test('when two long passwords differ only behind the 72nd byte, then they are different passwords', async () => {
  const at = await createTestApp();
  const long = `${'éàü'.repeat(30)} tail`;
  await signUp(at, { password: long });
  const [mail] = await at.mails();
  await confirm(somebody(at), mail?.text, long);
  expect((await somebody(at).signIn(ADA.email, `${long}!`)).status).toBe(401);
  expect((await somebody(at).signIn(ADA.email, long)).status).toBe(200);
});

test('when a password is kept, then it is a bcrypt hash and the mail about it keeps no copy', async () => {
  const at = await createTestApp();
  await signUp(at);
  const [row] = await at.deps.db.select({ hash: accounts.passwordHash }).from(accounts);
  expect(row?.hash).toMatch(/^\$2b\$\d\d\$[./A-Za-z0-9]{53}$/);
  expect((await at.mails())[0]?.text).not.toContain(PASSWORD);
});
