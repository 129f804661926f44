import { expect, test } from 'vitest';
import type { StudyDocument } from '#shared/study/study.document';
import { createTestApp } from '../support/app';
import { enter } from '../support/people';
import { documentOf, makeStudy, saveOf } from '../support/studies';

const THREE = documentOf('Three chords', ['chord-1', 'chord-2', 'chord-3']);

/** The study with the length of one chord changed. */
function withBeats(document: StudyDocument, chordId: string, beats: number): StudyDocument {
  const chords = document.chords.map((chord) => (chord.id === chordId ? { ...chord, beats } : chord));
  return { ...document, chords };
}

async function scene() {
  const at = await createTestApp();
  const ada = await enter(at, { name: 'Ada' });
  const { id } = await makeStudy(ada, THREE);
  const save = (document: StudyDocument, basedOn: number, requestKey?: string) =>
    ada.send('PUT', `/api/studies/${id}`, saveOf(document, basedOn, requestKey));
  return { at, ada, id, save };
}

test('when a stale save touches other chords than the newer ones, then it is merged, and told what was there', async () => {
  const { ada, id, save } = await scene();
  await save(withBeats(THREE, 'chord-1', 2), 1);
  await save({ ...withBeats(THREE, 'chord-1', 2), tempoBpm: 72 }, 2);
  const answer = await save(withBeats(THREE, 'chord-3', 8), 1);
  expect(answer.status).toBe(200);
  const both = { ...withBeats(withBeats(THREE, 'chord-1', 2), 'chord-3', 8), tempoBpm: 72 };
  expect(answer.body).toMatchObject({ number: 4, document: both });
  expect(answer.body.merged).toEqual({
    withNumber: 3,
    savedByNames: [],
    chords: [{ change: 'changed', place: 1, name: null }],
    settings: ['tempo'],
    reordered: false,
  });
  expect((await ada.send('GET', `/api/studies/${id}`)).body.document).toEqual(both);
});

test('when both touched the same chord, then it is set aside as before', async () => {
  const { save } = await scene();
  await save(withBeats(THREE, 'chord-1', 2), 1);
  const answer = await save(withBeats(THREE, 'chord-1', 3), 1);
  expect([answer.status, answer.body.error.code]).toEqual([409, 'study.stale']);
  expect(answer.body.error.details.setAsideNumber).toBe(1);
});

test('when a merged save comes again under its key, then it gets the same answer; with other content it is refused', async () => {
  const { save } = await scene();
  await save(withBeats(THREE, 'chord-1', 2), 1);
  const key = '5f0a3d5c-6c2b-4a3f-8a54-1d7c2f0f9b11';
  const first = await save(withBeats(THREE, 'chord-2', 2), 1, key);
  const again = await save(withBeats(THREE, 'chord-2', 2), 1, key);
  expect([again.status, again.body]).toEqual([200, first.body]);
  const other = await save(withBeats(THREE, 'chord-2', 5), 1, key);
  expect([other.status, other.body.error.code]).toEqual([409, 'request.reused']);
});

test('when two rename and change at once, then one save holds both', async () => {
  const { ada, id, save } = await scene();
  await save(withBeats(THREE, 'chord-2', 1), 1);
  const renamed = await ada.send('PATCH', `/api/studies/${id}`, {
    title: 'Ebb',
    basedOn: 1,
    requestKey: '5f0a3d5c-6c2b-4a3f-8a54-1d7c2f0f9b12',
  });
  expect(renamed.body).toMatchObject({
    number: 3,
    document: { ...withBeats(THREE, 'chord-2', 1), title: 'Ebb' },
  });
});

test('when 200 saves come from 20 writers, each on a chord of their own, then all are accepted and all content is there', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const chordIds = Array.from({ length: 20 }, (_, writer) => `chord-${writer}`);
  const document = documentOf('Twenty hands', chordIds);
  const { id } = await makeStudy(ada, document);
  const numbers: number[] = [];
  const write = async (chordId: string) => {
    let [basedOn, mine] = [1, document];
    for (let n = 1; n <= 10; n += 1) {
      mine = withBeats(mine, chordId, n);
      const answer = await ada.send('PUT', `/api/studies/${id}`, saveOf(mine, basedOn));
      expect(answer.status).toBe(200);
      expect(answer.body.document.chords.find((chord: { id: string }) => chord.id === chordId).beats).toBe(n);
      numbers.push(answer.body.number);
      [basedOn, mine] = [answer.body.number, answer.body.document];
    }
  };
  await Promise.all(chordIds.map(write));
  expect(numbers.sort((a, b) => a - b)).toEqual(Array.from({ length: 200 }, (_, index) => index + 2));
  const last = await ada.send('GET', `/api/studies/${id}`);
  expect(last.body.number).toBe(201);
  expect(last.body.document).toEqual({
    ...document,
    chords: document.chords.map((chord) => ({ ...chord, beats: 10 })),
  });
}, 120_000);
