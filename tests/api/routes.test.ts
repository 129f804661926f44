import supertest from 'supertest';
import { expect, test } from 'vitest';
import * as accountEndpoints from '#shared/contracts/accounts';
import * as analysisEndpoints from '#shared/contracts/analysis';
import * as annotationEndpoints from '#shared/contracts/annotations';
import * as demoEndpoints from '#shared/contracts/demo';
import * as docsEndpoints from '#shared/contracts/docs';
import * as measureEndpoints from '#shared/contracts/measures';
import * as shareEndpoints from '#shared/contracts/shares';
import * as shelfEndpoints from '#shared/contracts/shelf';
import * as studyEndpoints from '#shared/contracts/studies';
import * as versionEndpoints from '#shared/contracts/versions';
import { createTestApp, type TestApp } from '../support/app';
import { enter, somebody, type Somebody } from '../support/people';
import { documentOf, keepOnShelf, makeStudy, saveOf, shareWith, voicingOf } from '../support/studies';

const KEY = '0b4b6c5e-7a53-4a39-9f25-3f0c6e6f3a11';
const STUDY = '/api/studies/:studyId';
const SECRET = 'AAAAAAAAAAAAAAAAAAAAAA';

type Row = readonly [method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE', path: string, body?: object];

/** Open to visitors: what they do is checked in tests of their own. */
const OPEN: readonly Row[] = [
  ['GET', '/api/session'],
  ['GET', '/api/session/csrf-token'],
  ['POST', '/api/session', { email: 'a@x.example', password: 'not the pass phrase' }],
  ['DELETE', '/api/session'],
  [
    'POST',
    '/api/accounts',
    { email: 'a@x.example', name: 'A', password: 'six geese a-laying', role: 'composer' },
  ],
  ['POST', '/api/confirmation-requests', { email: 'a@x.example' }],
  ['POST', '/api/confirmations', { token: SECRET, password: 'x' }],
  ['POST', '/api/password-reset-requests', { email: 'a@x.example' }],
  ['POST', '/api/password-resets', { token: SECRET, password: 'six geese a-laying' }],
  ['GET', '/api/demo/people'],
  ['GET', '/api/demo/mails'],
];

/** For scripts and lessons: the same for everybody, and nothing is changed, so no CSRF token is asked for. */
const FOR_SCRIPTS: readonly Row[] = [
  ['POST', '/api/analysis', { voices: [{ section: 'cello', pitch: 'C2' }] }],
  ['POST', '/api/measures/roughness', { model: 'sethares', midi: [60, 64, 67], harmonics: 11 }],
  ['POST', '/api/measures/limits', { section: 'cello' }],
  ['GET', '/api/openapi.json'],
];

const CREATE: Row = ['POST', '/api/studies', { document: documentOf('New'), requestKey: KEY }];
const REMARK = { anchor: { kind: 'study' }, text: 'Listen to the basses', requestKey: KEY };

/** What each person is answered, in the order of PEOPLE. */
const GUARDED: readonly (readonly [Row, readonly number[]])[] = [
  //                                                                            owner cmnt view strg admin visitor
  [
    ['GET', '/api/studies'],
    [200, 200, 200, 200, 403, 401],
  ],
  [CREATE, [200, 200, 200, 200, 403, 401]],
  [
    ['GET', STUDY],
    [200, 200, 200, 404, 403, 401],
  ],
  [
    ['PUT', STUDY, saveOf(documentOf('Changed'), 1, KEY)],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['PATCH', STUDY, { title: 'Renamed', basedOn: 1, requestKey: KEY }],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['DELETE', STUDY],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['POST', `${STUDY}/restorations`],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['POST', `${STUDY}/duplicates`, { requestKey: KEY }],
    [200, 200, 200, 404, 403, 401],
  ],
  [
    ['PUT', `${STUDY}/tags`, { tags: ['low'] }],
    [200, 200, 200, 404, 403, 401],
  ],
  [
    ['GET', '/api/study-filters'],
    [200, 200, 200, 200, 403, 401],
  ],
  [
    ['GET', '/api/deleted-studies'],
    [200, 200, 200, 200, 403, 401],
  ],
  // Earlier thoughts are not shared with the study.
  [
    ['GET', `${STUDY}/versions`],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['GET', `${STUDY}/versions/:kind/:number`],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['PATCH', `${STUDY}/versions/:kind/:number`, { name: 'First try' }],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['GET', '/api/shelf'],
    [200, 200, 200, 200, 403, 401],
  ],
  [
    ['POST', '/api/shelf', { name: 'Open fifth', voicing: voicingOf(), requestKey: KEY }],
    [200, 200, 200, 200, 403, 401],
  ],
  // The voicing is the owner's: nobody else has a shelf with it.
  [
    ['PATCH', '/api/shelf/:voicingId', { name: 'Renamed' }],
    [200, 404, 404, 404, 403, 401],
  ],
  [
    ['DELETE', '/api/shelf/:voicingId'],
    [200, 404, 404, 404, 403, 401],
  ],
  [
    ['GET', `${STUDY}/shares`],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['POST', `${STUDY}/shares`, { email: 'new@x.example', may: 'view' }],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['DELETE', `${STUDY}/shares/:shareId`],
    [200, 403, 403, 404, 403, 401],
  ],
  [
    ['GET', `${STUDY}/annotations`],
    [200, 200, 200, 404, 403, 401],
  ],
  [
    ['POST', `${STUDY}/annotations`, REMARK],
    [200, 200, 403, 404, 403, 401],
  ],
  // The annotation is a third person's: its author and the owner alone may take it away.
  [
    ['DELETE', `${STUDY}/annotations/:annotationId`],
    [200, 403, 403, 404, 403, 401],
  ],
];
const PEOPLE = ['owner', 'comment', 'view', 'stranger', 'administrator', 'visitor'] as const;

interface Scene {
  readonly at: TestApp;
  readonly who: Readonly<Record<(typeof PEOPLE)[number], Somebody>>;
  readonly fill: (path: string) => string;
}

/** One study with an owner, people who may comment and view, an annotation of somebody else's, and strangers. */
async function setScene(): Promise<Scene> {
  const at = await createTestApp();
  const owner = await enter(at, { role: 'teacher' });
  const comment = await enter(at, { role: 'composer' });
  const view = await enter(at, { role: 'student' });
  const third = await enter(at, { role: 'student' });
  const { id } = await makeStudy(owner);
  await shareWith(owner, id, comment.email, 'comment');
  await shareWith(owner, id, view.email, 'view');
  const share = await shareWith(owner, id, third.email, 'comment');
  const annotation = await third.send('POST', `/api/studies/${id}/annotations`, REMARK);
  const voicing = await keepOnShelf(owner, 'Open fifth');
  const fill = (path: string) =>
    path
      .replace(':voicingId', voicing.id)
      .replace(':kind', 'accepted')
      .replace(':number', '1')
      .replace(':studyId', id)
      .replace(':shareId', share.id)
      .replace(':annotationId', String(annotation.body.id));
  const stranger = await enter(at, { role: 'teacher' });
  const administrator = await enter(at, { role: 'administrator' });
  return { at, who: { owner, comment, view, stranger, administrator, visitor: somebody(at) }, fill };
}

function nameOf([method, path]: Row): string {
  return `${method} ${path}`;
}

test('when a contract has a route, then it is in the lists above, and nothing else is', () => {
  const modules = [
    accountEndpoints,
    analysisEndpoints,
    annotationEndpoints,
    demoEndpoints,
    docsEndpoints,
    measureEndpoints,
    shareEndpoints,
    shelfEndpoints,
    studyEndpoints,
    versionEndpoints,
  ];
  const contracts = modules
    .flatMap((module) => Object.values(module))
    .filter(
      (value): value is { method: string; path: string } => typeof value === 'object' && 'method' in value,
    )
    .map(({ method, path }) => `${method} ${path}`);
  const listed = [...OPEN, ...FOR_SCRIPTS, ...GUARDED.map(([row]) => row)].map(nameOf);
  expect(listed.sort()).toEqual(contracts.sort());
});

test.each(GUARDED.map(([row, expected]) => [nameOf(row), row, expected] as const))(
  'when %s is called by each kind of person, then each is answered as written here',
  async (_name, [method, path, body], expected) => {
    const answers: Record<string, number> = {};
    const { who, fill } = await setScene();
    // The owner comes last: what they do may take the study away from the others.
    for (const person of [...PEOPLE].reverse()) {
      answers[person] = (await who[person].send(method, fill(path), body)).status;
    }
    expect(PEOPLE.map((person) => answers[person])).toEqual(expected);
  },
  60_000,
);

test.each(FOR_SCRIPTS.map((row) => [nameOf(row), row] as const))(
  'when %s is called by each kind of person, then all are answered alike, without a token, and get no cookie',
  async (_name, [method, path, body]) => {
    const { at, who } = await setScene();
    const first = await supertest(at.app)[method === 'GET' ? 'get' : 'post'](path).send(body);
    expect([first.status, first.headers['set-cookie']]).toEqual([200, undefined]);
    for (const person of PEOPLE) {
      const answer = await who[person].sendRaw(method, path, {}, body);
      expect([answer.status, answer.headers['set-cookie']]).toEqual([200, undefined]);
      expect(answer.body).toEqual(first.body);
    }
  },
  60_000,
);

const CHANGING = [...OPEN, ...GUARDED.map(([row]) => row)].filter(([method]) => method !== 'GET');

test.each(CHANGING.map((row) => [nameOf(row), row] as const))(
  'when %s carries no CSRF token, or one of another session, then it is refused',
  async (_name, [method, path, body]) => {
    const { at, who, fill } = await setScene();
    const other = (await somebody(at).send('GET', '/api/session/csrf-token')).body.csrfToken;
    const tries: Record<string, string>[] = [{}, { 'x-csrf-token': '' }, { 'x-csrf-token': String(other) }];
    for (const headers of tries) {
      const answer = await who.owner.sendRaw(method, fill(path), headers, body);
      expect(answer.status).toBe(403);
      expect(answer.body.error.code).toBe('csrf.invalid');
    }
  },
  60_000,
);

test('when an id is well made but names nothing, then the answer is the same as for a stranger', async () => {
  const { who, fill } = await setScene();
  const foreign = await who.stranger.send('GET', fill(STUDY));
  const unknown = await who.stranger.send('GET', `/api/studies/${SECRET}`);
  expect([unknown.status, unknown.body]).toEqual([foreign.status, foreign.body]);
});
