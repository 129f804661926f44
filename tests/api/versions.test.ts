import { and, asc, eq } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';
import { expect, test } from 'vitest';
import type { Version } from '#shared/contracts/versions';
import { prune } from '#server/db/pruning';
import { saves } from '#server/db/schema/saves';
import { studies } from '#server/db/schema/studies';
import { createTestApp, type TestApp } from '../support/app';
import { enter, type Person } from '../support/people';
import { documentOf, makeStudy, saveOf, shareWith } from '../support/studies';

const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const DAY = 24 * HOUR;
const HERE = 'machine-0123456789';
const THERE = 'machine-9876543210';

async function saveTitle(ada: Person, id: string, title: string, basedOn: number, deviceKey = HERE) {
  const answer = await ada.send('PUT', `/api/studies/${id}`, {
    ...saveOf(documentOf(title), basedOn),
    deviceKey,
  });
  if (answer.status !== 200) throw new Error(`not saved: ${answer.status}`);
}

async function versions(ada: Person, id: string, query = ''): Promise<Version[]> {
  return (await ada.send('GET', `/api/studies/${id}/versions${query}`)).body.versions;
}

async function acceptedNumbers({ deps }: TestApp, id: string): Promise<number[]> {
  const rows = await deps.db
    .select({ number: saves.number })
    .from(saves)
    .where(and(eq(saves.studyId, id), eq(saves.kind, 'accepted')))
    .orderBy(asc(saves.number));
  return rows.map(({ number }) => number);
}

test('when saves follow each other within ten minutes on one machine, then they show as one version', async () => {
  const at = await createTestApp();
  const ada = await enter(at, { name: 'Ada' });
  const { id } = await makeStudy(ada);
  at.advance(10 * MINUTE);
  await saveTitle(ada, id, 'Two', 1);
  at.advance(9 * MINUTE);
  await saveTitle(ada, id, 'Three', 2);
  at.advance(MINUTE);
  await saveTitle(ada, id, 'Four', 3, THERE);
  const listed = await versions(ada, id);
  expect(listed.map(({ firstNumber, number }) => [firstNumber, number])).toEqual([
    [4, 4],
    [2, 3],
    [1, 1],
  ]);
  expect(listed[1]).toMatchObject({
    kind: 'accepted',
    savedByName: 'Ada',
    merged: false,
    name: null,
    basedOn: 1,
  });
});

test('when versions are more than a page, then the next page goes on behind them', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  for (let n = 1; n < 5; n += 1) {
    at.advance(HOUR);
    await saveTitle(ada, id, `Save ${n}`, n);
  }
  const first = await ada.send('GET', `/api/studies/${id}/versions?limit=3`);
  expect(first.body.versions.map(({ number }: Version) => number)).toEqual([5, 4, 3]);
  const second = await ada.send('GET', `/api/studies/${id}/versions?limit=3&before=${first.body.next}`);
  expect(second.body.versions.map(({ number }: Version) => number)).toEqual([2, 1]);
  expect(second.body.next).toBeNull();
});

test('when a version is read, then it is as it was saved, and one set aside can be read too', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada, documentOf('First'));
  await saveTitle(ada, id, 'Theirs', 1);
  await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('Mine'), 1));
  const read = await ada.send('GET', `/api/studies/${id}/versions/accepted/1`);
  expect(read.body.document).toEqual(documentOf('First'));
  expect(await versions(ada, id, '?kind=set-aside')).toMatchObject([
    { kind: 'set-aside', number: 1, basedOn: 1 },
  ]);
  const aside = await ada.send('GET', `/api/studies/${id}/versions/set-aside/1`);
  expect(aside.body.document.title).toBe('Mine');
  for (const path of ['accepted/3', 'set-aside/2', 'accepted/0', 'other/1']) {
    expect((await ada.send('GET', `/api/studies/${id}/versions/${path}`)).status).toBe(404);
  }
});

test('when a version is named, then it stands for itself in the list, and the name can be taken off again', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  await saveTitle(ada, id, 'Two', 1);
  const path = `/api/studies/${id}/versions/accepted/1`;
  expect((await ada.send('PATCH', path, { name: '  <b>First</b> ' })).body).toEqual({ name: '<b>First</b>' });
  at.advance(MINUTE);
  await saveTitle(ada, id, 'Three', 2);
  expect((await versions(ada, id)).map(({ number, name }) => [number, name])).toEqual([
    [3, null],
    [1, '<b>First</b>'],
  ]);
  await ada.send('PATCH', path, { name: null });
  expect((await versions(ada, id)).every(({ name }) => name === null)).toBe(true);
  expect((await ada.send('PATCH', path, { name: ' ' })).status).toBe(422);
});

/** A study with one save every twenty minutes for two hours, all older than the given days. */
async function twoHoursOfSaves(at: TestApp, ada: Person, days: number) {
  const { id } = await makeStudy(ada);
  // On the hour, so that the test knows which saves share one.
  const start = Math.floor((at.deps.clock().getTime() - days * DAY) / DAY) * DAY;
  await at.deps.db
    .update(saves)
    .set({ savedAt: new Date(start) })
    .where(eq(saves.studyId, id));
  for (let n = 1; n <= 6; n += 1) {
    await saveTitle(ada, id, `Save ${n}`, n);
    await at.deps.db
      .update(saves)
      .set({ savedAt: new Date(start + n * 20 * MINUTE) })
      .where(and(eq(saves.studyId, id), eq(saves.kind, 'accepted'), eq(saves.number, n + 1)));
  }
  return { id, start };
}

test('when saves are older than a week, then one an hour stays, with the first, the newest and the named', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await twoHoursOfSaves(at, ada, 10);
  await ada.send('PATCH', `/api/studies/${id}/versions/accepted/5`, { name: 'Keep me' });
  await prune(at.deps);
  // Numbers 1 to 3 are of the first hour, 4 to 6 of the second, 7 of the third.
  expect(await acceptedNumbers(at, id)).toEqual([1, 3, 5, 6, 7]);
  await prune(at.deps);
  expect(await acceptedNumbers(at, id)).toEqual([1, 3, 5, 6, 7]);
});

test('when saves are older than a month, then one a day stays', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await twoHoursOfSaves(at, ada, 40);
  await prune(at.deps);
  expect(await acceptedNumbers(at, id)).toEqual([1, 7]);
});

test('when saves are of this week, then all stay', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await twoHoursOfSaves(at, ada, 5);
  await prune(at.deps);
  expect(await acceptedNumbers(at, id)).toEqual([1, 2, 3, 4, 5, 6, 7]);
});

test('when a version was the newest as it was annotated or shared, then it stays for good', async () => {
  const at = await createTestApp();
  const [ada, ben] = [await enter(at), await enter(at)];
  const { id, start } = await twoHoursOfSaves(at, ada, 40);
  const remark = { anchor: { kind: 'study' }, text: 'Here', requestKey: randomUUID() };
  await ada.send('POST', `/api/studies/${id}/annotations`, remark);
  await at.deps.pool.query('update annotations set written_at = ?', [new Date(start + 25 * MINUTE)]);
  await shareWith(ada, id, ben.email, 'view');
  await at.deps.pool.query('update shares set shared_at = ?', [new Date(start + 80 * MINUTE)]);
  await prune(at.deps);
  // Number 2 was saved at 20 minutes, number 5 at 80.
  expect(await acceptedNumbers(at, id)).toEqual([1, 2, 5, 7]);
});

test('when a save began from one that is not kept any more, then it is set aside and nothing is lost', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await twoHoursOfSaves(at, ada, 40);
  await prune(at.deps);
  const late = await ada.send(
    'PUT',
    `/api/studies/${id}`,
    saveOf({ ...documentOf('Late'), tempoBpm: 90 }, 4),
  );
  expect([late.status, late.body.error.details.setAsideNumber]).toEqual([409, 1]);
});

test('when a study has lain in the trash for 30 days, then it goes for good, and not before', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  await ada.send('DELETE', `/api/studies/${id}`);
  at.advance(30 * DAY - MINUTE);
  await prune(at.deps);
  expect(await at.deps.db.select({ id: studies.id }).from(studies)).toEqual([{ id }]);
  at.advance(2 * MINUTE);
  await prune(at.deps);
  expect(await at.deps.db.select({ id: studies.id }).from(studies)).toEqual([]);
  expect(await acceptedNumbers(at, id)).toEqual([]);
});
