import { randomUUID } from 'node:crypto';
import type { RowDataPacket } from 'mysql2/promise';
import { expect, test } from 'vitest';
import type { StudyRow } from '#shared/contracts/studies';
import type { StudyDocument } from '#shared/study/study.document';
import { beginEdition, summariseDue } from '#server/studies/summaries';
import { createTestApp } from '../support/app';
import { enter, type Person } from '../support/people';
import { documentOf, makeStudy, saveOf, shareWith } from '../support/studies';

async function titles(person: Person, query: string): Promise<string[]> {
  const answer = await person.send('GET', `/api/studies?${query}`);
  expect(answer.status).toBe(200);
  return answer.body.studies.map(({ title }: StudyRow) => title);
}

/** An open fifth far up and a low third: the lower one clouds more, by any published limit. */
function voiced(title: string, low: string, high: string): StudyDocument {
  const document = documentOf(title);
  const chords = document.chords.map((chord) => ({
    ...chord,
    voices: chord.voices.map((voice, place) => ({ ...voice, pitch: place === 0 ? low : high })),
  }));
  return { ...document, chords };
}

test('when words are looked for, then title and subject are searched, and % and _ are signs like others', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  await makeStudy(ada, documentOf('100% low'));
  await makeStudy(ada, documentOf('1000 low'));
  await makeStudy(ada, { ...documentOf('Bells'), about: 'what the LOW strings do!' });
  expect((await titles(ada, 'search=low&sort=title')).sort()).toEqual(['100% low', '1000 low', 'Bells']);
  expect(await titles(ada, 'search=100%25')).toEqual(['100% low']);
  expect(await titles(ada, 'search=_')).toEqual([]);
  expect(await titles(ada, 'search=do!')).toEqual(['Bells']);
});

test('when tags are set, then they are each person’s own, one for all spellings of its letters’ case, and filter', async () => {
  const at = await createTestApp();
  const [ada, ben] = [await enter(at), await enter(at)];
  const { id } = await makeStudy(ada, documentOf('Tagged'));
  await makeStudy(ada, documentOf('Plain'));
  await shareWith(ada, id, ben.email, 'view');
  const set = await ada.send('PUT', `/api/studies/${id}/tags`, { tags: ['low', 'Low', 'week 3'] });
  expect(set.body).toEqual({ tags: ['low', 'week 3'] });
  await ben.send('PUT', `/api/studies/${id}/tags`, { tags: ['from Ada'] });
  expect(await titles(ada, 'tag=LOW')).toEqual(['Tagged']);
  expect(await titles(ada, 'tag=from%20Ada')).toEqual([]);
  const filters = await ada.send('GET', '/api/study-filters');
  expect(filters.body).toEqual({
    tags: [
      { tag: 'low', count: 1 },
      { tag: 'week 3', count: 1 },
    ],
    keys: [{ tonic: 'C', mode: 'major' }],
  });
  await ada.send('PUT', `/api/studies/${id}/tags`, { tags: [] });
  expect((await ada.send('GET', '/api/study-filters')).body.tags).toEqual([]);
});

test('when the list is filtered by owner and key, then only those are in it', async () => {
  const at = await createTestApp();
  const [ada, ben] = [await enter(at), await enter(at)];
  await makeStudy(ada, documentOf('Mine'));
  const theirs = { ...documentOf('Theirs'), key: { tonic: 'D', mode: 'minor' } as const };
  const { id } = await makeStudy(ben, theirs);
  await shareWith(ben, id, ada.email, 'comment');
  expect(await titles(ada, 'whose=own')).toEqual(['Mine']);
  expect(await titles(ada, 'whose=received')).toEqual(['Theirs']);
  expect(await titles(ada, 'tonic=D&mode=minor')).toEqual(['Theirs']);
  expect(await titles(ada, 'tonic=D&mode=major')).toEqual([]);
});

test('when studies are summed up, then rows carry their profiles and can be sorted and filtered by clouding', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  await makeStudy(ada, voiced('High fifth', 'C4', 'G4'));
  const { id } = await makeStudy(ada, voiced('Low third', 'C2', 'E2'));
  const before = (await ada.send('GET', '/api/studies')).body.studies[0];
  expect(before).toMatchObject({ cloudiest: null, summedUp: false, chords: [] });
  await summariseDue(at.deps, await beginEdition(at.deps));
  const [first, second]: StudyRow[] = (await ada.send('GET', '/api/studies?sort=clouded')).body.studies;
  expect([first?.title, second?.title]).toEqual(['Low third', 'High fifth']);
  expect(first).toMatchObject({ summedUp: true, chordCount: 1 });
  expect(first?.chords[0]?.registers).toHaveLength(7);
  // 50 stands at the published limit of the interval: a third on C2 is far under its own.
  expect(first?.cloudiest).toBeGreaterThan(50);
  expect(await titles(ada, 'from=50')).toEqual(['Low third']);
  expect(await titles(ada, 'to=49')).toEqual(['High fifth']);
  expect(await titles(ada, 'sort=clouded&order=asc')).toEqual(['High fifth', 'Low third']);

  await ada.send('PUT', `/api/studies/${id}`, saveOf(voiced('Low third', 'C4', 'G4'), 1));
  await summariseDue(at.deps, await beginEdition(at.deps));
  const rows: StudyRow[] = (await ada.send('GET', '/api/studies?sort=title')).body.studies;
  expect(rows[1]?.cloudiest).toBe(rows[0]?.cloudiest);
}, 60_000);

test('when the model has changed since, then what the earlier one said is due again', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  await makeStudy(ada, voiced('Low third', 'C2', 'E2'));
  const summedUp = async () => (await ada.send('GET', '/api/studies')).body.studies[0].summedUp;
  await summariseDue(at.deps, await beginEdition(at.deps));
  await beginEdition(at.deps);
  expect(await summedUp()).toBe(true);
  await at.deps.pool.query(
    "update studies set summary = json_set(summary, '$[0].of', 'earlier.0'), cloudiest = 3",
  );
  await beginEdition(at.deps);
  expect(await summedUp()).toBe(false);
  await summariseDue(at.deps, await beginEdition(at.deps));
  expect((await ada.send('GET', '/api/studies')).body.studies[0].cloudiest).toBeGreaterThan(50);
}, 60_000);

test('when lists of any order are read page by page, then each study comes once, in that order', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const names = ['b', 'A', 'a', 'C', 'Ä', 'c'];
  for (const name of names) await makeStudy(ada, documentOf(name));
  for (const query of ['sort=title', 'sort=title&order=desc', 'sort=clouded', 'sort=changed&order=asc']) {
    const paged: string[] = [];
    for (let next: string | null = ''; next !== null;) {
      const page = await ada.send('GET', `/api/studies?${query}&limit=2${next && `&after=${next}`}`);
      paged.push(...page.body.studies.map(({ title }: StudyRow) => title));
      next = page.body.next;
    }
    expect(paged).toEqual(await titles(ada, `${query}&limit=50`));
    expect([...paged].sort()).toEqual([...names].sort());
  }
  const byTitle = await titles(ada, 'sort=title');
  expect(byTitle.slice(3).map((title) => title.toLowerCase())).toEqual(['b', 'c', 'c']);
  const other = (await ada.send('GET', '/api/studies?limit=1')).body.next;
  expect((await ada.send('GET', `/api/studies?sort=title&after=${other}`)).status).toBe(422);
});

test('when a study is duplicated, then the copy is one’s own, made once for each request', async () => {
  const at = await createTestApp();
  const [ada, ben] = [await enter(at, { name: 'Ada' }), await enter(at, { name: 'Ben' })];
  const { id } = await makeStudy(ada, documentOf('Ebb'));
  await shareWith(ada, id, ben.email, 'view');
  const body = { requestKey: randomUUID() };
  const copies = [
    await ben.send('POST', `/api/studies/${id}/duplicates`, body),
    await ben.send('POST', `/api/studies/${id}/duplicates`, body),
  ];
  expect(copies[0]?.body).toMatchObject({ relation: 'owner', ownerName: 'Ben', number: 1 });
  expect(copies[0]?.body.document).toEqual({ ...documentOf('Ebb'), title: 'Ebb (copy)' });
  expect(copies[1]?.body.id).toBe(copies[0]?.body.id);
});

test('when studies are deleted, then their owner alone finds them in the trash, with the day they go', async () => {
  const at = await createTestApp();
  const [ada, ben] = [await enter(at), await enter(at)];
  for (const title of ['First', 'Second', 'Third']) {
    const { id } = await makeStudy(ada, documentOf(title));
    await shareWith(ada, id, ben.email, 'view');
    at.advance(1000);
    await ada.send('DELETE', `/api/studies/${id}`);
  }
  const page = await ada.send('GET', '/api/deleted-studies?limit=2');
  expect(page.body.studies.map(({ title }: { title: string }) => title)).toEqual(['Third', 'Second']);
  const [{ deletedAt, goesAt }] = page.body.studies;
  expect(Date.parse(goesAt) - Date.parse(deletedAt)).toBe(30 * 24 * 60 * 60 * 1000);
  const rest = await ada.send('GET', `/api/deleted-studies?limit=2&after=${page.body.next}`);
  expect(rest.body).toMatchObject({ studies: [{ title: 'First' }], next: null });
  expect((await ben.send('GET', '/api/deleted-studies')).body.studies).toEqual([]);
});

test('when one person has many studies, then each order is read by its index', async () => {
  const at = await createTestApp();
  const { id } = await enter(at);
  for (const [column, index] of [
    ['saved_at', 'studies_owner_newest'],
    ['title', 'studies_owner_title'],
    ['cloudiest', 'studies_owner_cloudiest'],
  ]) {
    const [rows] = await at.deps.pool.query<RowDataPacket[]>(
      `explain select id from studies where owner_id = ? and deleted_at is null order by ${column} desc, id desc limit 21`,
      [id],
    );
    expect([rows[0]?.key, String(rows[0]?.Extra).includes('filesort')]).toEqual([index, false]);
  }
});
