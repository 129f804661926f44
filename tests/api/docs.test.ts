import supertest from 'supertest';
import { beforeEach, expect, test } from 'vitest';
import { createAnalysis } from '#shared/contracts/analysis';
import { measureLimits, measureRoughness } from '#shared/contracts/measures';
import { createApp } from '#server/app';
import { EXAMPLE_REQUESTS, shortened } from '#server/docs/examples';
import { createTestApp, type TestApp } from '../support/app';
import { call } from '../support/scripts';

const ROUTES = [
  [createAnalysis, EXAMPLE_REQUESTS.analysis],
  [measureRoughness, EXAMPLE_REQUESTS.roughness],
  [measureLimits, EXAMPLE_REQUESTS.limits],
] as const;
const named = ROUTES.map(([endpoint, request]) => [endpoint.path, endpoint, request] as const);

let at: TestApp;
beforeEach(async () => {
  at = await createTestApp();
});

const readDocument = async () => (await at.browser().get('/api/openapi.json')).body;
const readPage = () => at.browser().get('/api/docs');

test('when the document is read, then it tells of the three routes, open to all', async () => {
  const { openapi, paths, info } = await readDocument();
  expect(openapi).toMatch(/^3\.1\./);
  expect(info.version).toMatch(/^\d+\.\d+\.\d+$/);
  expect(Object.keys(paths)).toEqual(ROUTES.map(([{ path }]) => path));
  for (const path of Object.keys(paths)) {
    expect(Object.keys(paths[path])).toEqual(['post']);
    expect(paths[path].post.security).toEqual([]);
    expect(Object.keys(paths[path].post.responses)).toEqual(['200', '415', '422', '429', '503']);
  }
});

test.each(named)(
  'when the example of %s is sent, then what is answered is what is printed beside it, by the contract',
  async (path, endpoint, request) => {
    const { post } = (await readDocument()).paths[path];
    expect(post.requestBody.content['application/json'].example).toEqual(request);
    const answer = await call(at, path, request);
    expect(answer.status).toBe(200);
    const printed = post.responses['200'].content['application/json'].example;
    expect(printed).toEqual(shortened(answer.body));
    expect(endpoint.response.safeParse(printed).success).toBe(true);
  },
);

test.each(named)(
  'when %s is described, then the fields of its answer are the described ones, and no others',
  async (path, _endpoint, request) => {
    const { post } = (await readDocument()).paths[path];
    const { schema } = post.responses['200'].content['application/json'];
    const answer = await call(at, path, request);
    expect(Object.keys(schema.properties)).toEqual(Object.keys(answer.body));
    expect([...schema.required].sort()).toEqual(Object.keys(answer.body).sort());
  },
);

test('when lists are long, then three of them are shown; short ones stay whole', () => {
  expect(
    shortened({ a: [1, 2, 3, 4, 5, 6, 7, 8], b: [{ c: Array.from({ length: 9 }, (_, i) => i) }] }),
  ).toEqual({
    a: [1, 2, 3, 4, 5, 6, 7, 8],
    b: [{ c: [0, 1, 2] }],
  });
});

test('when the page is read, then it is HTML without script, without anything from elsewhere, under the strict policy', async () => {
  const page = await readPage();
  expect([page.status, page.type]).toEqual([200, 'text/html']);
  expect(page.headers['content-security-policy']).toContain("default-src 'none'");
  expect(page.headers['set-cookie']).toBeUndefined();
  expect(page.text).not.toMatch(/<script|<link|<img|@import|url\(|\son\w+=/i);
  expect(page.text).not.toMatch(/(src|href)="(?!\/|#)/);
  expect(page.text).toContain('<html lang="en">');
});

test('when the page is read, then each route stands there with its example, its fields and its failures', async () => {
  const { text } = await readPage();
  for (const [{ path, method }, request] of ROUTES) {
    expect(text).toContain(`${method} ${path}`);
    expect(text).toContain(JSON.stringify(request).replaceAll('"', '&quot;'));
  }
  for (const field of ['voices[].technique.mute', 'explanation.registers[].pairs[].share', 'upper.section']) {
    expect(text).toContain(`<code>${field}</code>`);
  }
  for (const status of ['415', '422', '429', '503']) expect(text).toContain(`<code>${status}</code>`);
  expect(text).toContain('600 calls a minute');
});

test('when the computing fails for the first reader, then the next one is answered all the same', async () => {
  let tries = 0;
  const { measurements } = at.deps;
  const analyse: typeof measurements.analyse = (request) => {
    tries += 1;
    return tries === 1 ? Promise.reject(new Error('no thread')) : measurements.analyse(request);
  };
  const app = createApp({ ...at.deps, measurements: { ...measurements, analyse } });
  expect((await supertest(app).get('/api/docs')).status).toBe(500);
  expect((await supertest(app).get('/api/docs')).status).toBe(200);
});
