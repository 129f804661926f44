import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import type { RowDataPacket } from 'mysql2/promise';
import { expect, test } from 'vitest';
import { studies } from '#server/db/schema/studies';
import { createTestApp } from '../support/app';
import { enter } from '../support/people';
import { documentOf, makeStudy, saveOf, shareWith } from '../support/studies';

test('when a study is made, then it can be read as it was sent, under number 1', async () => {
  const at = await createTestApp();
  const ada = await enter(at, { name: 'Ada' });
  const document = documentOf('Lock gates', ['chord-1', 'chord-2']);
  const made = await makeStudy(ada, document);
  expect(made).toEqual({
    id: expect.stringMatching(/^[\w-]{22}$/),
    number: 1,
    document,
    relation: 'owner',
    ownerName: 'Ada',
    savedAt: at.deps.clock().toISOString(),
  });
  expect((await ada.send('GET', `/api/studies/${made.id}`)).body).toEqual(made);
});

test('when the same request to make a study comes twice, or twice at once, then there is one study', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const body = { document: documentOf('Once'), requestKey: randomUUID() };
  const answers = await Promise.all([1, 2, 3].map(() => ada.send('POST', '/api/studies', body)));
  const late = await ada.send('POST', '/api/studies', body);
  expect(new Set([...answers, late].map(({ status, body: study }) => `${status} ${study.id}`)).size).toBe(1);
  expect(late.status).toBe(200);
  expect((await ada.send('GET', '/api/studies')).body.studies).toHaveLength(1);
});

test('when a request key comes again with something else, then it does not pass for done', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const requestKey = randomUUID();
  await ada.send('POST', '/api/studies', { document: documentOf('One'), requestKey });
  const other = await ada.send('POST', '/api/studies', { document: documentOf('Another'), requestKey });
  expect(other.status).toBe(409);
  expect(other.body.error.code).toBe('request.reused');
});

test('when two people use one request key, then each has a study', async () => {
  const at = await createTestApp();
  const body = { document: documentOf('Mine'), requestKey: randomUUID() };
  const one = await (await enter(at)).send('POST', '/api/studies', body);
  const two = await (await enter(at)).send('POST', '/api/studies', body);
  expect([one.status, two.status]).toEqual([200, 200]);
  expect(one.body.id).not.toBe(two.body.id);
});

test('when studies are listed page by page, then own and received ones come newest first, each once', async () => {
  const at = await createTestApp();
  const ada = await enter(at, { name: 'Ada' });
  const ben = await enter(at, { name: 'Ben' });
  const titles: string[] = [];
  for (let n = 0; n < 12; n += 1) {
    // Three at a time are of one moment: their order must still be one.
    if (n % 3 === 0) at.advance(1000);
    const owner = n % 2 === 0 ? ada : ben;
    const { id } = await makeStudy(owner, documentOf(`Study ${n}`));
    if (owner === ben && n % 4 === 1) await shareWith(ben, id, ada.email, 'view');
    if (owner === ada || n % 4 === 1) titles.push(`Study ${n}`);
  }
  const listed: { title: string; savedAt: string; relation: string; ownerName: string }[] = [];
  let next: string | null = '';
  while (next !== null) {
    const { body } = await ada.send('GET', `/api/studies?limit=2${next && `&after=${next}`}`);
    expect(body.studies.length).toBeLessThanOrEqual(2);
    listed.push(...body.studies);
    next = body.next;
  }
  expect(listed.map(({ title }) => title).sort()).toEqual(titles.sort());
  expect(listed.map(({ savedAt }) => savedAt)).toEqual(
    listed
      .map(({ savedAt }) => savedAt)
      .sort()
      .reverse(),
  );
  for (const { title, relation, ownerName } of listed) {
    const own = Number(title.slice('Study '.length)) % 2 === 0;
    expect([relation, ownerName]).toEqual(own ? ['owner', 'Ada'] : ['view', 'Ben']);
  }
});

test('when the list is read, then its indexes are used and no table is read whole', async () => {
  const at = await createTestApp();
  const { id, email } = await enter(at);
  const [own] = await at.deps.pool.query<RowDataPacket[]>(
    'explain select id, saved_at from studies where owner_id = ? and deleted_at is null order by saved_at desc, id desc limit 21',
    [id],
  );
  expect(own[0]?.key).toBe('studies_owner_newest');
  expect(String(own[0]?.Extra)).not.toContain('filesort');
  const [received] = await at.deps.pool.query<RowDataPacket[]>(
    'explain select s.id from shares h join studies s on s.id = h.study_id where h.email = ?',
    [email],
  );
  expect(received.map(({ key }) => key)).not.toContain(null);
});

test('when a study is deleted, then nobody sees it until its owner undoes that', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const ben = await enter(at);
  const study = await makeStudy(ada);
  await shareWith(ada, study.id, ben.email, 'comment');
  expect((await ada.send('DELETE', `/api/studies/${study.id}`)).status).toBe(200);
  expect((await ada.send('DELETE', `/api/studies/${study.id}`)).status).toBe(200);
  for (const person of [ada, ben]) {
    expect((await person.send('GET', `/api/studies/${study.id}`)).status).toBe(404);
    expect((await person.send('GET', `/api/studies/${study.id}/annotations`)).status).toBe(404);
    expect((await person.send('GET', '/api/studies')).body.studies).toEqual([]);
  }
  expect((await ada.send('PUT', `/api/studies/${study.id}`, saveOf(documentOf('x'), 1))).status).toBe(404);
  expect((await ben.send('POST', `/api/studies/${study.id}/restorations`)).status).toBe(404);
  const restored = await ada.send('POST', `/api/studies/${study.id}/restorations`);
  expect(restored.body).toEqual(study);
  expect((await ben.send('GET', `/api/studies/${study.id}`)).status).toBe(200);
});

test('when titles carry emoji, right-to-left letters, invisible and NUL characters, then they come back the same', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  for (const title of [
    '🎻'.repeat(30),
    'שקיעה في الضباب',
    'a\u200bb\u0000c',
    '{{7*7}} <img src=x onerror=alert(1)> &lt;%41',
    "'; drop table studies; --",
  ]) {
    const { id } = await makeStudy(ada, documentOf(title));
    expect((await ada.send('GET', `/api/studies/${id}`)).body.document.title).toBe(title);
  }
});

test("when fields that are not the sender's to set come along, then they are refused by name", async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const answer = await ada.send('POST', '/api/studies', {
    document: documentOf('Mine'),
    requestKey: randomUUID(),
    ownerId: 'somebody-else',
  });
  expect(answer.status).toBe(422);
  expect(answer.body.error.details).toEqual([{ path: 'body', message: expect.stringContaining('ownerId') }]);
});

test('when the owner is somebody else in the database, then an answer never names ids or addresses of people', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const ben = await enter(at);
  const { id } = await makeStudy(ada);
  await shareWith(ada, id, ben.email, 'comment');
  const seen = JSON.stringify((await ben.send('GET', `/api/studies/${id}`)).body);
  expect(seen).not.toContain(ada.id);
  expect(seen).not.toContain(ada.email);
  const rows = await at.deps.db.select({ id: studies.id }).from(studies).where(eq(studies.ownerId, ada.id));
  expect(rows).toEqual([{ id }]);
});
