import { expect, test } from 'vitest';
import { checkHealth } from '#server/health/health.service';

test('when the database does not answer in time, then it counts as away', async () => {
  const silent = { query: () => new Promise<never>(() => undefined) };
  expect(await checkHealth(silent, '1.2.3', 1)).toEqual({
    status: 'degraded',
    database: 'down',
    version: '1.2.3',
  });
});
