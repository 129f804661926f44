import { randomUUID } from 'node:crypto';
import { gzipSync } from 'node:zlib';
import { expect, test } from 'vitest';
import { MAX_CHORDS, MAX_VOICES } from '#shared/study/study.document';
import { createTestApp, type TestApp } from '../support/app';
import { enter, somebody, type Somebody } from '../support/people';
import { documentOf, makeStudy } from '../support/studies';

const MIB = 1024 * 1024;
const JSON_TYPE = { 'content-type': 'application/json' };
const KEY = '0b4b6c5e-7a53-4a39-9f25-3f0c6e6f3a11';

async function tokenOf(person: Somebody): Promise<string> {
  return (await person.send('GET', '/api/session/csrf-token')).body.csrfToken;
}

/** Sends these very bytes: no library between mends or refuses them. */
async function sendBytes(at: TestApp, bytes: Buffer | string, headers: Record<string, string> = JSON_TYPE) {
  const agent = at.browser();
  const { csrfToken } = (await agent.get('/api/session/csrf-token')).body;
  const request = agent.post('/api/session').set({ ...headers, 'x-csrf-token': csrfToken });
  return request.serialize((body: unknown) => body as string).send(bytes as string);
}

test.each([
  ['is no JSON', '{"email": ', 400, 'json.invalid'],
  ['is empty', '', 400, 'json.invalid'],
  ['holds bytes that are no UTF-8', Buffer.from([0x7b, 0x22, 0xff, 0xfe, 0x22, 0x7d]), 400, 'text.invalid'],
  ['holds half a character, escaped', '{"email": "\\ud800"}', 422, 'json.refused'],
  ['is nested 10,000 deep', '['.repeat(10_000) + ']'.repeat(10_000), 422, 'json.refused'],
  ['is nested 32 deep', '['.repeat(32) + ']'.repeat(32), 422, 'json.refused'],
  [
    'brings __proto__',
    '{"email":"a@x.example","password":"x","__proto__":{"admin":true}}',
    422,
    'json.refused',
  ],
  ['brings constructor', '{"constructor":{"prototype":{"admin":true}}}', 422, 'json.refused'],
  ['is a list', '[]', 422, 'input.invalid'],
  ['is null', 'null', 422, 'input.invalid'],
])('when a body %s, then it is refused and nothing else happens', async (_what, bytes, status, code) => {
  const answer = await sendBytes(await createTestApp(), bytes);
  expect([answer.status, answer.body.error.code]).toEqual([status, code]);
  expect(Object.keys(answer.body)).toEqual(['error']);
  expect(answer.body.error.message).toMatch(/^[A-Z].*\.$/);
});

test.each([
  ['a form', { 'content-type': 'application/x-www-form-urlencoded' }],
  ['plain text', { 'content-type': 'text/plain' }],
  ['JSON in Latin-1', { 'content-type': 'application/json; charset=iso-8859-1' }],
  ['an unknown compression', { ...JSON_TYPE, 'content-encoding': 'compress' }],
])('when a body comes as %s, then it is not read', async (_what, headers) => {
  const answer = await sendBytes(await createTestApp(), '{}', headers);
  expect([answer.status, answer.body.error.code]).toEqual([415, 'media.unsupported']);
});

test('when a body has 10 MB, or 3 MB and a byte, or unpacks to more, then it is too large', async () => {
  const at = await createTestApp();
  const text = (bytes: number) => JSON.stringify({ email: 'x'.repeat(bytes - '{"email":""}'.length) });
  for (const bytes of [10 * MIB, 3 * MIB + 1]) {
    const answer = await sendBytes(at, text(bytes));
    expect([answer.status, answer.body.error.code]).toEqual([413, 'body.tooLarge']);
  }
  const bomb = await sendBytes(at, gzipSync(text(50 * MIB)), { ...JSON_TYPE, 'content-encoding': 'gzip' });
  expect([bomb.status, bomb.body.error.code]).toEqual([413, 'body.tooLarge']);
  expect((await sendBytes(at, text(3 * MIB))).status).toBe(422);
});

test('when a body is wrong in several places, then every one of them is named', async () => {
  const at = await createTestApp();
  const answer = await somebody(at).send('POST', '/api/accounts', {
    email: 'x',
    name: '',
    password: '1',
    more: true,
  });
  expect(answer.status).toBe(422);
  const paths = answer.body.error.details.map(({ path }: { path: string }) => path).sort();
  expect(paths).toEqual(['body', 'body.email', 'body.name', 'body.password', 'body.role']);
});

test('when a body has thousands of faults, then the answer stays short', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  const document = {
    ...documentOf('x'),
    chords: Array.from({ length: 200 }, (_, n) => ({
      id: `chord-${n}`,
      voices: Array.from({ length: 40 }, () => 0),
    })),
  };
  const answer = await ada.send('POST', '/api/studies', { document, requestKey: KEY });
  expect(answer.status).toBe(422);
  expect(answer.body.error.details).toHaveLength(101);
  expect(answer.body.error.details.at(-1)).toEqual({ path: 'body', message: 'and 7900 more faults' });
});

test.each([
  ['a repeated parameter', '?limit=2&limit=3', 'query.limit'],
  ['a limit of 0', '?limit=0', 'query.limit'],
  ['a limit of 51', '?limit=51', 'query.limit'],
  ['a limit that is no number', '?limit=many', 'query.limit'],
  ['a place that is none', '?after=here', 'query.after'],
  ['an order that is none', '?order=upwards', 'query.order'],
  ['an unknown parameter', '?colour=blue', 'query'],
])('when the list is asked for with %s, then the parameter is named', async (_what, query, path) => {
  const at = await createTestApp();
  const ada = await enter(at);
  const answer = await ada.send('GET', `/api/studies${query}`);
  expect(answer.status).toBe(422);
  expect(answer.body.error.details).toEqual([{ path, message: expect.any(String) }]);
});

test('when the list is asked for with limits at their edges, then it answers', async () => {
  const at = await createTestApp();
  const ada = await enter(at);
  for (const limit of [1, 50])
    expect((await ada.send('GET', `/api/studies?limit=${limit}`)).status).toBe(200);
});

test.each([
  ['1', 404],
  ['..%2f..%2fetc%2fpasswd', 404],
  ["' or 1=1 -- 'xxxxxxxxx", 404],
  ['%E0%A4%A', 400],
  [`${'A'.repeat(22)}%00`, 404],
  ['A'.repeat(5000), 404],
])('when the id of a study is %s, then there is no such study', async (id, status) => {
  const at = await createTestApp();
  const ada = await enter(at);
  await makeStudy(ada);
  const answer = await ada.send('GET', `/api/studies/${id.includes('%') ? id : encodeURIComponent(id)}`);
  expect(answer.status).toBe(status);
  expect(answer.body.error.code).toBe(status === 404 ? 'route.unknown' : 'request.invalid');
});

test.each(['shares', 'annotations'])(
  'when an id among the %s of a study is none that can be, then it names nothing',
  async (noun) => {
    const ada = await enter(await createTestApp());
    const { id } = await makeStudy(ada);
    for (const other of ['%C3%A9', '1', `${'A'.repeat(22)}%00`, 'A'.repeat(5000)]) {
      const answer = await ada.send('DELETE', `/api/studies/${id}/${noun}/${other}`);
      expect([answer.status, answer.body.error.code]).toEqual([404, 'route.unknown']);
    }
  },
);

test('when an address under /api names nothing, then the answer is 404 in the one shape', async () => {
  const at = await createTestApp();
  for (const path of ['/api', '/api/', '/api/nothing', '/API/nothing', '/api/studies/x/y/z']) {
    const answer = await somebody(at).send('GET', path);
    expect(answer.status).toBe(404);
    expect(answer.body).toEqual({
      error: { code: 'route.unknown', message: 'There is nothing at this address.' },
    });
  }
});

test('when the password is long but within bounds, then it is read; beyond, it is named', async () => {
  const at = await createTestApp();
  const signIn = (length: number) => somebody(at).signIn('a@x.example', 'p'.repeat(length));
  expect((await signIn(256)).status).toBe(401);
  expect((await signIn(257)).status).toBe(422);
});

test('when visitors send what only signed-in people may, then they are asked to sign in, whatever they sent', async () => {
  const at = await createTestApp();
  const visitor = somebody(at);
  const headers = { 'x-csrf-token': await tokenOf(visitor), ...JSON_TYPE };
  const answer = await visitor.sendRaw('POST', '/api/studies', headers, '{"not json');
  expect([answer.status, answer.body.error.code]).toEqual([401, 'session.required']);
});

test('when two chords of a study, or two voices of a chord, have one id, then it is not kept', async () => {
  const owner = await enter(await createTestApp());
  const study = documentOf('Twins', ['chord-1', 'chord-2']);
  const [first, second] = study.chords;
  const twinChords = { ...study, chords: [first, { ...second, id: 'chord-1' }] };
  const twinVoices = {
    ...study,
    chords: [{ ...first, voices: first?.voices.map((voice) => ({ ...voice, id: 'voice-1' })) }],
  };
  for (const [document, path] of [
    [twinChords, 'body.document.chords'],
    [twinVoices, 'body.document.chords.0.voices'],
  ] as const) {
    const answer = await owner.send('POST', '/api/studies', { document, requestKey: randomUUID() });
    expect(answer.status).toBe(422);
    expect(answer.body.error.details.map((fault: { path: string }) => fault.path)).toEqual([path]);
  }
});

test('when a study is as large as one may be, then it is kept whole', async () => {
  const owner = await enter(await createTestApp());
  const ids = (kind: string, count: number) => Array.from({ length: count }, (_, n) => `${kind}-${1000 + n}`);
  const study = documentOf('The longest', ids('chord', MAX_CHORDS));
  const full = study.chords.map((chord) => ({
    ...chord,
    voices: ids(chord.id, MAX_VOICES).map((id) => ({ ...chord.voices[0], id })),
  }));
  const document = { ...study, chords: full };
  const answer = await owner.send('POST', '/api/studies', { document, requestKey: randomUUID() });
  expect(answer.status).toBe(200);
  expect(answer.body.document).toEqual(document);
});
