import supertest from 'supertest';
import { expect, test } from 'vitest';
import { createApp } from '#server/app';
import { openDb, openPool } from '#server/db/connection';
import { createTestApp } from '../support/app';

test('when the database answers, then so does the program, with its version', async () => {
  const { browser } = await createTestApp();
  const answer = await browser().get('/api/health');
  expect(answer.status).toBe(200);
  expect(answer.body).toEqual({
    status: 'ok',
    database: 'up',
    version: expect.stringMatching(/^\d+\.\d+\.\d+$/),
  });
  expect(answer.headers['cache-control']).toContain('no-store');
});

test('when the database is away, then the answer is 503 and says so', async () => {
  const { deps } = await createTestApp();
  const away = openPool({ user: 'nobody', password: '', database: 'none', socketPath: '/nowhere/db' });
  const answer = await supertest(createApp({ ...deps, pool: away, db: openDb(away) })).get('/api/health');
  await away.end();
  expect(answer.status).toBe(503);
  expect(answer.body).toMatchObject({ status: 'degraded', database: 'down' });
});
