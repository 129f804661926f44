import { randomUUID } from 'node:crypto';
import { expect, test } from 'vitest';
import type { ShelfVoicing } from '#shared/contracts/shelf';
import { createTestApp } from '../support/app';
import { enter } from '../support/people';
import { keepOnShelf, voicingOf } from '../support/studies';

test('when a chord is kept, then it is on the shelf as it was, once for each request', async () => {
  const at = await createTestApp();
  const [ada, ben] = [await enter(at), await enter(at)];
  const body = { name: 'Open fifth', voicing: voicingOf(), requestKey: randomUUID() };
  const send = () => ada.send('POST', '/api/shelf', body);
  const [first, second] = await Promise.all([send(), send()]);
  expect([first.status, second.status, second.body.id]).toEqual([200, 200, first.body.id]);
  expect((await ada.send('GET', '/api/shelf')).body).toEqual({ voicings: [first.body], next: null });
  expect(first.body.voicing).toEqual(voicingOf());
  expect((await ben.send('GET', '/api/shelf')).body.voicings).toEqual([]);
  const other = await ada.send('POST', '/api/shelf', {
    ...body,
    voicing: { ...voicingOf(), a4Hz: 442 },
  });
  expect([other.status, other.body.error.code]).toEqual([409, 'request.reused']);
});

test('when it is renamed, found and taken off, then the shelf follows', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await keepOnShelf(ada, 'Fifth');
  await keepOnShelf(ada, '50 % cello');
  await ada.send('PATCH', `/api/shelf/${id}`, { name: 'Wide open' });
  const names = async (query: string) =>
    (await ada.send('GET', `/api/shelf?${query}`)).body.voicings.map(({ name }: ShelfVoicing) => name);
  expect(await names('search=wide')).toEqual(['Wide open']);
  expect(await names('search=%25')).toEqual(['50 % cello']);
  await ada.send('DELETE', `/api/shelf/${id}`);
  expect(await names('')).toEqual(['50 % cello']);
  expect((await ada.send('DELETE', `/api/shelf/${id}`)).status).toBe(404);
});

test('when the shelf is long, then it comes page by page, the last kept first', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  for (const name of ['a', 'b', 'c']) {
    await keepOnShelf(ada, name);
    at.advance(1000);
  }
  const page = await ada.send('GET', '/api/shelf?limit=2');
  expect(page.body.voicings.map(({ name }: ShelfVoicing) => name)).toEqual(['c', 'b']);
  const rest = await ada.send('GET', `/api/shelf?limit=2&after=${page.body.next}`);
  expect(rest.body).toMatchObject({ voicings: [{ name: 'a' }], next: null });
});

test('when a chord has no notes, or the name none, then the field says so', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const voicing = voicingOf();
  const empty = { ...voicing, chord: { ...voicing.chord, voices: [] } };
  const answer = await ada.send('POST', '/api/shelf', {
    name: ' ',
    voicing: empty,
    requestKey: randomUUID(),
  });
  expect(answer.status).toBe(422);
  expect(answer.body.error.details.map(({ path }: { path: string }) => path).sort()).toEqual([
    'body.name',
    'body.voicing.chord.voices',
  ]);
});
