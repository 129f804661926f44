import { randomUUID } from 'node:crypto';
import type { PoolConnection, RowDataPacket } from 'mysql2/promise';
import { expect, test, vi } from 'vitest';
import { createTestApp } from '../support/app';
import { enter, type Person } from '../support/people';
import { documentOf, makeStudy, saveOf, shareWith } from '../support/studies';

function remark(text: string, changes: object = {}) {
  return { anchor: { kind: 'study' }, text, requestKey: randomUUID(), ...changes };
}

async function sharedStudy() {
  const at = await createTestApp();
  const ada = await enter(at, { name: 'Ada' });
  const ben = await enter(at, { name: 'Ben' });
  const { id } = await makeStudy(ada, documentOf('Lock gates', ['chord-1', 'chord-2']));
  await shareWith(ada, id, ben.email, 'comment');
  const path = `/api/studies/${id}/annotations`;
  const read = async (person: Person) => (await person.send('GET', path)).body.annotations;
  return { at, ada, ben, id, path, read };
}

/** How many statements of the program stand and wait: what locks the study is one of them. */
async function waitingStatements(connection: PoolConnection): Promise<number> {
  const [rows] = await connection.query<RowDataPacket[]>(
    "SELECT id FROM information_schema.processlist WHERE info LIKE '%for update' AND id <> CONNECTION_ID()",
  );
  return rows.length;
}

test('when somebody annotates a study and a chord, then everybody who sees it reads that, oldest first', async () => {
  const { at, ada, ben, path, read } = await sharedStudy();
  const first = await ben.send(
    'POST',
    path,
    remark('The third is low.', { anchor: { kind: 'chord', chordId: 'chord-2' } }),
  );
  at.advance(1000);
  const second = await ada.send('POST', path, remark('On purpose.'));
  expect(first.body).toEqual({
    id: expect.any(String),
    anchor: { kind: 'chord', chordId: 'chord-2' },
    text: 'The third is low.',
    authorName: 'Ben',
    mine: true,
    writtenAt: expect.stringMatching(/Z$/),
  });
  expect(await read(ada)).toEqual([{ ...first.body, mine: false }, second.body]);
  expect(await read(ben)).toEqual([first.body, { ...second.body, mine: false }]);
});

test('when the chord is not in the newest save, then the annotation is refused', async () => {
  const { ada, ben, id, path } = await sharedStudy();
  await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('Lock gates', ['chord-1']), 1));
  const answer = await ben.send(
    'POST',
    path,
    remark('Where?', { anchor: { kind: 'chord', chordId: 'chord-2' } }),
  );
  expect(answer.status).toBe(422);
  expect(answer.body.error.details).toEqual([{ path: 'body.anchor.chordId', message: expect.any(String) }]);
});

test('when a chord is taken away after it was annotated, then the annotation stays', async () => {
  const { ada, ben, id, path, read } = await sharedStudy();
  await ben.send('POST', path, remark('Here', { anchor: { kind: 'chord', chordId: 'chord-2' } }));
  await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('Lock gates', ['chord-1']), 1));
  expect(await read(ada)).toHaveLength(1);
});

test('when the same annotation is sent twice, or twice at once, then there is one', async () => {
  const { ben, path, read } = await sharedStudy();
  const body = remark('Once', { anchor: { kind: 'chord', chordId: 'chord-1' } });
  const answers = await Promise.all([1, 2, 3].map(() => ben.send('POST', path, body)));
  const late = await ben.send('POST', path, body);
  for (const answer of answers) expect(answer.body).toEqual(late.body);
  expect(await read(ben)).toEqual([late.body]);
  expect((await ben.send('POST', path, { ...body, text: 'Other' })).body.error.code).toBe('request.reused');
});

test('when an annotation is taken away by its author or by the owner, then it is gone; nobody else can', async () => {
  const { at, ada, ben, id, path, read } = await sharedStudy();
  const cid = await enter(at);
  await shareWith(ada, id, cid.email, 'comment');
  const one = await ben.send('POST', path, remark('One'));
  const two = await ben.send('POST', path, remark('Two'));
  const three = await ada.send('POST', path, remark('Three'));
  const remove = async (person: Person, annotationId: string) =>
    (await person.send('DELETE', `${path}/${annotationId}`)).status;
  expect(await remove(cid, one.body.id)).toBe(403);
  expect(await remove(ben, three.body.id)).toBe(403);
  expect(await remove(ben, one.body.id)).toBe(200);
  expect(await remove(ada, two.body.id)).toBe(200);
  expect(await remove(ada, two.body.id)).toBe(404);
  expect((await read(ada)).map(({ text }: { text: string }) => text)).toEqual(['Three']);
});

test('when an annotation of another study is named, then it stays', async () => {
  const { at, ben, path, read } = await sharedStudy();
  const { body } = await ben.send('POST', path, remark('Mine'));
  const eve = await enter(at);
  const own = await makeStudy(eve);
  expect((await eve.send('DELETE', `/api/studies/${own.id}/annotations/${body.id}`)).status).toBe(404);
  expect(await read(ben)).toHaveLength(1);
});

test('when the right to annotate is taken back, then their remarks stay and they write no more', async () => {
  const { ada, ben, id, path, read } = await sharedStudy();
  await ben.send('POST', path, remark('Still here'));
  await shareWith(ada, id, ben.email, 'view');
  expect((await ben.send('POST', path, remark('More'))).status).toBe(403);
  expect(await read(ben)).toHaveLength(1);
});

test('when the study is locked while the right to annotate is taken back, then the remark that waits is refused', async () => {
  const { at, ada, ben, id, path, read } = await sharedStudy();
  const holder = await at.deps.pool.getConnection();
  await holder.query('START TRANSACTION');
  await holder.query('SELECT id FROM studies WHERE id = ? FOR UPDATE', [id]);
  const waiting = ben.send('POST', path, remark('Too late'));
  const asked = waiting.then((answer) => answer.status);
  await vi.waitUntil(async () => (await waitingStatements(holder)) > 0);
  await holder.query('UPDATE shares SET may = ? WHERE study_id = ?', ['view', id]);
  await holder.query('COMMIT');
  holder.release();
  expect(await asked).toBe(403);
  expect(await read(ada)).toEqual([]);
});

test.each([
  ['no text', { text: '   ' }],
  ['4001 characters', { text: 'x'.repeat(4001) }],
  ['no request key', { requestKey: undefined }],
  ['an anchor of an unknown kind', { anchor: { kind: 'bar', bar: 3 } }],
  ['an author of its own choice', { authorId: 'somebody' }],
])('when an annotation has %s, then it is refused', async (_what, changes) => {
  const { ben, path, read } = await sharedStudy();
  const answer = await ben.send('POST', path, remark('x', changes));
  expect([answer.status, answer.body.error.code]).toEqual([422, 'input.invalid']);
  expect(await read(ben)).toEqual([]);
});

test('when an annotation holds markup or 4000 characters, then it is kept as typed', async () => {
  const { ben, path, read } = await sharedStudy();
  for (const text of ['<script>alert(1)</script> {{7*7}} &amp;', '🎻'.repeat(2000)]) {
    expect((await ben.send('POST', path, remark(text))).body.text).toBe(text);
  }
  expect(await read(ben)).toHaveLength(2);
});

test('when somebody who has just signed in asks for the token several times at once, then it is one token', async () => {
  const { ben } = await sharedStudy();
  const asked = await Promise.all([1, 2, 3, 4].map(() => ben.send('GET', '/api/session/csrf-token')));
  expect(new Set(asked.map(({ body }) => body.csrfToken)).size).toBe(1);
});
