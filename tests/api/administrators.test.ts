import { expect, test } from 'vitest';
import { createAdministrator } from '#server/accounts/administrators.service';
import { createTestApp } from '../support/app';
import { makeAccount, somebody } from '../support/people';

const BOSS = { email: 'Boss@people.example', name: 'The Boss', password: 'partridge in a pear tree' };

test('when an administrator is made, then they sign in at once and may not read studies', async () => {
  const at = await createTestApp();
  await createAdministrator(at.deps, BOSS);
  const boss = somebody(at);
  const answer = await boss.signIn('boss@people.example', BOSS.password);
  expect(answer.body.account).toMatchObject({ role: 'administrator', name: 'The Boss' });
  expect((await boss.send('GET', '/api/studies')).status).toBe(403);
});

test('when what is given cannot be used, then every fault is told', async () => {
  const at = await createTestApp();
  const attempt = createAdministrator(at.deps, { email: 'none', name: ' ', password: 'short' });
  await expect(attempt).rejects.toThrow(/e-mail address.*give a name.*at least 8/);
});

test('when the address has an account, then that stays as it is', async () => {
  const at = await createTestApp();
  await makeAccount(at, { email: 'boss@people.example' });
  await expect(createAdministrator(at.deps, BOSS)).rejects.toThrow('has an account already');
  expect((await somebody(at).signIn('boss@people.example')).body.account.role).toBe('composer');
});
