import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { mariadbFiles } from '#server/setup/mariadb/files';
import { findRunning } from '#server/setup/mariadb/leftover';
import { healthStatus, startProduct, type Product } from '../support/product';
import { enterDemo, saveAs, studiesOf } from '../support/running-demo';

const PATIENCE = { timeout: 30_000, interval: 50 };

let folder: string;
let product: Product;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'siltline-tests-'));
  product = await startProduct({ DATA_DIR: folder });
});

afterAll(async () => {
  await product.end();
  await rm(folder, { recursive: true, force: true });
});

function killDatabase(): number {
  const running = findRunning(mariadbFiles(folder));
  if (!running) throw new Error('The database does not run.');
  process.kill(running.pid, 'SIGKILL');
  return running.pid;
}

test('when the database is killed, then the program answers 503, starts it again and has lost nothing', async () => {
  const caller = await enterDemo(product.url);
  const id = await saveAs(caller, 'Before the database was killed');
  const killed = killDatabase();
  await vi.waitFor(async () => expect(await healthStatus(product.url)).toBe(503), PATIENCE);
  await vi.waitFor(async () => expect(await healthStatus(product.url)).toBe(200), PATIENCE);
  expect(findRunning(mariadbFiles(folder))?.pid).not.toBe(killed);
  expect((await studiesOf(caller)).map((study) => study.id)).toContain(id);
});

test('when the program is killed, then the next start stops what it left and has lost nothing', async () => {
  const id = await saveAs(await enterDemo(product.url), 'Before the program was killed');
  await product.end('SIGKILL');
  const leftover = findRunning(mariadbFiles(folder));
  expect(leftover).toBeDefined();

  product = await startProduct({ DATA_DIR: folder });
  expect(product.output()).toContain('a killed program left running was stopped');
  expect(findRunning(mariadbFiles(folder))?.pid).not.toBe(leftover?.pid);
  expect((await studiesOf(await enterDemo(product.url))).map((study) => study.id)).toContain(id);
});

test('when both are killed, then the next start has lost nothing', async () => {
  const id = await saveAs(await enterDemo(product.url), 'Before both were killed');
  const ended = product.end('SIGKILL');
  killDatabase();
  await ended;

  product = await startProduct({ DATA_DIR: folder });
  expect((await studiesOf(await enterDemo(product.url))).map((study) => study.id)).toContain(id);
});
