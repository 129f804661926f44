import { expect, test } from 'vitest';
import { createTestApp } from '../support/app';
import { enter, makeAccount } from '../support/people';
import { documentOf, makeStudy, shareWith } from '../support/studies';

test('when a study is shared with somebody who has no account yet, then they have it once they do', async () => {
  const at = await createTestApp();
  const ada = await enter(at, { name: 'Ada' });
  const { id } = await makeStudy(ada, documentOf('Lock gates'));
  await shareWith(ada, id, ' Ben@People.example', 'comment');
  const [mail] = await at.mails();
  expect(mail?.to).toBe('ben@people.example');
  expect(mail?.subject).toBe('Ada shared a study with you');
  expect(mail?.text).toContain('Lock gates');
  expect(mail?.text).toContain(`http://localhost:3000/studies/${id}`);
  const ben = await enter(at, { email: 'ben@people.example' });
  expect((await ben.send('GET', `/api/studies/${id}`)).body).toMatchObject({
    relation: 'comment',
    ownerName: 'Ada',
  });
});

test('when a study is shared again with the same address, then the right changes and no second mail goes out', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const ben = await enter(at);
  const { id } = await makeStudy(ada);
  const first = await shareWith(ada, id, ben.email, 'comment');
  const second = await shareWith(ada, id, ben.email.toUpperCase(), 'view');
  expect(second).toEqual({ ...first, may: 'view' });
  expect(await at.mails()).toHaveLength(1);
  expect((await ben.send('GET', `/api/studies/${id}`)).body.relation).toBe('view');
  const { body } = await ada.send('GET', `/api/studies/${id}/shares`);
  expect(body).toEqual({ shares: [second] });
});

test('when two share with one address at once, then there is one share and one mail', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  await Promise.all([1, 2, 3].map(() => shareWith(ada, id, 'ben@people.example', 'view')));
  expect((await ada.send('GET', `/api/studies/${id}/shares`)).body.shares).toHaveLength(1);
  expect(await at.mails()).toHaveLength(1);
});

test('when a share is taken back, then the study is gone for them at once', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const ben = await enter(at);
  const { id } = await makeStudy(ada);
  const share = await shareWith(ada, id, ben.email, 'comment');
  expect((await ada.send('DELETE', `/api/studies/${id}/shares/${share.id}`)).status).toBe(200);
  expect((await ben.send('GET', `/api/studies/${id}`)).status).toBe(404);
  expect((await ben.send('GET', '/api/studies')).body.studies).toEqual([]);
  const again = await ada.send('DELETE', `/api/studies/${id}/shares/${share.id}`);
  expect([again.status, again.body.error.code]).toEqual([404, 'share.unknown']);
});

test('when a share of another study is named, then it stays', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const eve = await enter(at);
  const { id } = await makeStudy(ada);
  const share = await shareWith(ada, id, 'ben@people.example', 'view');
  const own = await makeStudy(eve);
  expect((await eve.send('DELETE', `/api/studies/${own.id}/shares/${share.id}`)).status).toBe(404);
  expect((await ada.send('GET', `/api/studies/${id}/shares`)).body.shares).toEqual([share]);
});

test('when somebody shares with their own address, then the field says so', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const answer = await ada.send('POST', `/api/studies/${id}/shares`, { email: ada.email, may: 'view' });
  expect(answer.status).toBe(422);
  expect(answer.body.error.details).toEqual([{ path: 'body.email', message: 'this is your own address' }]);
});

test('when an address is shared with, then the answer does not tell whether it has an account', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const known = await makeAccount(at, { email: 'known@people.example', name: 'Known Person' });
  const one = await shareWith(ada, id, known.email, 'view');
  const two = await shareWith(ada, id, 'nobody@people.example', 'view');
  expect(Object.keys(one)).toEqual(Object.keys(two));
  expect(JSON.stringify(await at.mails())).not.toContain('Known Person');
});

test('when one mailbox is written to again and again, then the sharer has to wait', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const statuses: number[] = [];
  for (let n = 0; n < 11; n += 1) {
    const answer = await ada.send('POST', `/api/studies/${id}/shares`, {
      email: 'ben@people.example',
      may: 'view',
    });
    statuses.push(answer.status);
    if (answer.status === 200) await ada.send('DELETE', `/api/studies/${id}/shares/${answer.body.id}`);
  }
  expect(statuses.slice(0, 10).every((status) => status === 200)).toBe(true);
  expect(statuses[10]).toBe(429);
  expect(await at.mails()).toHaveLength(10);
});
