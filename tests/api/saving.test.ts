import { randomUUID } from 'node:crypto';
import { and, asc, eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { staleDetailsSchema, studySchema } from '#shared/contracts/studies';
import { saves } from '#server/db/schema/saves';
import { readDocument } from '#server/studies/documents';
import { createTestApp, type TestApp } from '../support/app';
import { enter } from '../support/people';
import { documentOf, makeStudy, saveOf } from '../support/studies';

async function kept({ deps }: TestApp, studyId: string, kind: 'accepted' | 'set-aside') {
  const rows = await deps.db
    .select({ number: saves.number, basedOn: saves.basedOn, document: saves.document })
    .from(saves)
    .where(and(eq(saves.studyId, studyId), eq(saves.kind, kind)))
    .orderBy(asc(saves.number));
  return rows.map(({ number, basedOn, document }) => ({
    number,
    basedOn,
    title: readDocument(document).title,
  }));
}

test('when a save began from the newest, then it is the newest and has the next number', async () => {
  const at = await createTestApp();
  const ada = await enter(at, { name: 'Ada' });
  const { id } = await makeStudy(ada);
  at.advance(5000);
  const saved = await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('Second'), 1));
  expect(saved.status).toBe(200);
  expect(saved.body).toMatchObject({ id, number: 2, savedAt: at.deps.clock().toISOString() });
  const { merged, ...study } = saved.body;
  expect(merged).toBeNull();
  expect((await ada.send('GET', `/api/studies/${id}`)).body).toEqual(study);
});

test('when a save began from an older one, then nothing is overwritten and both stand', async () => {
  const at = await createTestApp();
  const ada = await enter(at, { name: 'Ada' });
  const { id } = await makeStudy(ada, documentOf('First'));
  const newest = await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('Theirs'), 1));
  const refused = await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('Mine'), 1));
  expect(refused.status).toBe(409);
  expect(refused.body.error.code).toBe('study.stale');
  const details = staleDetailsSchema.parse(refused.body.error.details);
  const study = studySchema.parse(newest.body);
  expect(details).toEqual({ newest: { ...study, savedByName: 'Ada' }, setAsideNumber: 1 });
  expect((await ada.send('GET', `/api/studies/${id}`)).body.document.title).toBe('Theirs');
  expect(await kept(at, id, 'accepted')).toEqual([
    { number: 1, basedOn: 0, title: 'First' },
    { number: 2, basedOn: 1, title: 'Theirs' },
  ]);
  expect(await kept(at, id, 'set-aside')).toEqual([{ number: 1, basedOn: 1, title: 'Mine' }]);

  const chosen = await ada.send(
    'PUT',
    `/api/studies/${id}`,
    saveOf(documentOf('Mine'), details.newest.number),
  );
  expect(chosen.body.number).toBe(3);
});

test('when two save from one number at once, then one is the newest and the other is kept beside it', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const answers = await Promise.all(
    ['Left', 'Right'].map((title) => ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf(title), 1))),
  );
  expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  const all = [...(await kept(at, id, 'accepted')), ...(await kept(at, id, 'set-aside'))];
  expect(all.map(({ title }) => title).sort()).toEqual(['A study', 'Left', 'Right']);
});

test('when the same save comes twice, or twice at once, then there is one', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const body = saveOf(documentOf('Once'), 1);
  const send = () => ada.send('PUT', `/api/studies/${id}`, body);
  const answers = await Promise.all([send(), send(), send()]);
  expect(answers.map(({ status, body: study }) => [status, study.number])).toEqual([
    [200, 2],
    [200, 2],
    [200, 2],
  ]);
  await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('Later'), 2));
  const late = await send();
  expect(late.body).toMatchObject({ number: 2, document: { title: 'Once' } });
  expect(await kept(at, id, 'accepted')).toHaveLength(3);
});

test('when a refused save comes again, then it is set aside once', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('Newest'), 1));
  const body = saveOf(documentOf('Mine'), 1);
  const first = await ada.send('PUT', `/api/studies/${id}`, body);
  const again = await ada.send('PUT', `/api/studies/${id}`, body);
  expect([again.status, again.body]).toEqual([first.status, first.body]);
  expect(await kept(at, id, 'set-aside')).toHaveLength(1);
});

test('when 40 saves come from 8 writers at once, then each is there and the numbers have no gap', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const write = async (writer: number) => {
    let basedOn = 1;
    for (let n = 0; n < 5; n += 1) {
      const answer = await ada.send(
        'PUT',
        `/api/studies/${id}`,
        saveOf(documentOf(`${writer}.${n}`), basedOn),
      );
      basedOn = answer.status === 200 ? answer.body.number : answer.body.error.details.newest.number;
    }
  };
  await Promise.all(Array.from({ length: 8 }, (_, writer) => write(writer)));
  const accepted = await kept(at, id, 'accepted');
  const aside = await kept(at, id, 'set-aside');
  expect(accepted.map(({ number }) => number)).toEqual(accepted.map((_, index) => index + 1));
  expect(aside.map(({ number }) => number)).toEqual(aside.map((_, index) => index + 1));
  const titles = [...accepted, ...aside].map(({ title }) => title);
  const sent = Array.from({ length: 40 }, (_, n) => `${Math.floor(n / 5)}.${n % 5}`);
  expect(titles.sort()).toEqual(['A study', ...sent].sort());
}, 60_000);

test('when a save names a number that is not there yet, then the field says so', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const answer = await ada.send('PUT', `/api/studies/${id}`, saveOf(documentOf('x'), 2));
  expect(answer.status).toBe(422);
  expect(answer.body.error.details).toEqual([{ path: 'body.basedOn', message: expect.any(String) }]);
});

test('when a study is renamed, then that is a save; a stale one is set aside like any other', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada, documentOf('Old name', ['chord-1', 'chord-2']));
  const rename = (title: string, basedOn: number) =>
    ada.send('PATCH', `/api/studies/${id}`, { title, basedOn, requestKey: randomUUID() });
  const renamed = await rename('New name', 1);
  expect(renamed.body).toMatchObject({ number: 2, document: documentOf('New name', ['chord-1', 'chord-2']) });
  const stale = await rename('Other name', 1);
  expect(stale.body.error.code).toBe('study.stale');
  expect(await kept(at, id, 'set-aside')).toEqual([{ number: 1, basedOn: 1, title: 'Other name' }]);
});

test('when a chord without notes is saved, or 41 voices, or a note that is none, then each fault has its place', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const { id } = await makeStudy(ada);
  const document = documentOf('Faulty', ['chord-1', 'chord-2', 'chord-3', 'chord-4']);
  const [, empty, full, odd] = document.chords;
  empty?.voices.splice(0);
  const [voice] = full?.voices ?? [];
  for (let n = 0; voice !== undefined && n < 39; n += 1) full?.voices.push({ ...voice, id: `voice-${n}` });
  Object.assign(odd?.voices[0] ?? {}, { pitch: 'H2' });
  Object.assign(odd?.voices[1] ?? {}, { pitch: 'C12' });
  const answer = await ada.send('PUT', `/api/studies/${id}`, saveOf(document, 1));
  expect(answer.status).toBe(422);
  expect(answer.body.error.details).toEqual([
    { path: 'body.document.chords.1.voices', message: expect.stringContaining('no notes yet') },
    { path: 'body.document.chords.2.voices', message: expect.stringContaining('at most 40') },
    {
      path: 'body.document.chords.3.voices.0.pitch',
      message: expect.stringContaining('a pitch is a letter'),
    },
    { path: 'body.document.chords.3.voices.1.pitch', message: expect.any(String) },
  ]);
  expect((await ada.send('GET', `/api/studies/${id}`)).body.number).toBe(1);
});
