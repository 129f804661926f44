import { randomUUID } from 'node:crypto';
import { expect } from 'vitest';
import { listDemoPeople } from '#shared/contracts/demo';
import { createStudy, listStudies, studySchema } from '#shared/contracts/studies';
import { newStudy, newVoice } from '#shared/study/new-study';
import { createCaller, type Caller } from './caller';

/** Somebody signed in to the running demo as its composer. */
export async function enterDemo(url: string): Promise<Caller> {
  const caller = createCaller(url);
  const { people } = listDemoPeople.response.parse(await (await caller.get('/api/demo/people')).json());
  const composer = people.find(({ role }) => role === 'composer');
  const { email, password } = composer ?? {};
  expect((await caller.post('/api/session', { email, password })).status).toBe(200);
  return caller;
}

export async function studiesOf(caller: Caller) {
  return listStudies.response.parse(await (await caller.get('/api/studies?limit=50')).json()).studies;
}

/** Keeps a study of one fifth under a title. @returns its id */
export async function saveAs(caller: Caller, title: string): Promise<string> {
  const empty = newStudy('chord-1');
  const voices = [newVoice('voice-1', 'doubleBass', 'C2'), newVoice('voice-2', 'cello', 'G2')];
  const chords = empty.chords.map((chord) => ({ ...chord, voices }));
  const body = createStudy.body.parse({ document: { ...empty, title, chords }, requestKey: randomUUID() });
  const answer = await caller.post('/api/studies', body);
  expect(answer.status).toBe(200);
  return studySchema.parse(await answer.json()).id;
}
