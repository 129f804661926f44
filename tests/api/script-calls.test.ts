import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { expect, test } from 'vitest';
import { sessions } from '#server/db/schema/sessions';
import { SCRIPT_CALLS_PER_ADDRESS } from '#server/limits/limits.rules';
import { countTry } from '#server/limits/limits.service';
import { createTestApp } from '../support/app';
import { call } from '../support/scripts';

const MINUTE_MS = 60_000;
const CALLS_A_MINUTE = 600;
const CHORD = { voices: [{ section: 'cello', pitch: 'C2' }] };
const TONE = { model: 'sethares', midi: [60], harmonics: 1 };

test('when an address has called 600 times in a minute, then the next call waits, whatever it asks; the next minute it passes', async () => {
  const at = await createTestApp();
  const server = at.app.listen(0);
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  const post = (path: string, body: object) =>
    fetch(`http://127.0.0.1:${port}${path}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(body),
    });
  try {
    const counts = new Map<number, number>();
    for (let n = 0; n < CALLS_A_MINUTE; n += 1) {
      // A bad call counts like a good one.
      const { status } = await post('/api/measures/roughness', n % 2 === 0 ? TONE : {});
      counts.set(status, (counts.get(status) ?? 0) + 1);
    }
    expect([...counts].sort()).toEqual([
      [200, CALLS_A_MINUTE / 2],
      [422, CALLS_A_MINUTE / 2],
    ]);
    for (const [path, body] of [
      ['/api/analysis', CHORD],
      ['/api/measures/roughness', TONE],
      ['/api/measures/limits', { section: 'cello' }],
    ] as const) {
      const refused = await post(path, body);
      expect([refused.status, refused.headers.get('retry-after')]).toEqual([429, '60']);
      expect(await refused.json()).toMatchObject({ error: { code: 'rate.limited' } });
    }
    at.advance(MINUTE_MS);
    expect((await post('/api/analysis', CHORD)).status).toBe(200);
  } finally {
    server.close();
    server.closeAllConnections();
  }
}, 120_000);

test('when one address has to wait, then another and those who read the documents do not', async () => {
  const at = await createTestApp({ TRUST_PROXY: '1' });
  const from = (address: string) =>
    at.browser().post('/api/measures/roughness').set('x-forwarded-for', address).send(TONE);
  const { db, clock } = at.deps;
  for (let n = 0; n < CALLS_A_MINUTE; n += 1) {
    await countTry(db, SCRIPT_CALLS_PER_ADDRESS, '192.0.2.1', clock());
  }
  expect((await from('192.0.2.1')).status).toBe(429);
  expect((await from('192.0.2.2')).status).toBe(200);
  const reader = await at.browser().get('/api/openapi.json').set('x-forwarded-for', '192.0.2.1');
  expect(reader.status).toBe(200);
}, 120_000);

test('when scripts call, then no session is kept for them and no cookie is set', async () => {
  const at = await createTestApp();
  const answer = await call(at, '/api/analysis', CHORD);
  expect([answer.status, answer.headers['set-cookie']]).toEqual([200, undefined]);
  expect(await at.deps.db.select({ id: sessions.id }).from(sessions)).toEqual([]);
});

test('when a page of another site would call, then its browser is not let: JSON is asked for, and no origin is allowed', async () => {
  const at = await createTestApp();
  const form = await at
    .browser()
    .post('/api/analysis')
    .set({ origin: 'https://elsewhere.example', 'content-type': 'text/plain' })
    .send(JSON.stringify(CHORD));
  expect([form.status, form.body.error.code]).toEqual([415, 'media.unsupported']);
  expect(form.headers['access-control-allow-origin']).toBeUndefined();
});
