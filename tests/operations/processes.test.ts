import { mkdtemp, readFile, rm } from 'node:fs/promises';
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
  product = await startProduct({ DATA_DIR: folder, WORKERS: '2' });
});

afterAll(async () => {
  await product.end('SIGKILL');
  await rm(folder, { recursive: true, force: true });
});

/** The numbers of the processes that the program has started itself, but for the database. */
async function serverProcesses(): Promise<readonly number[]> {
  const { pid } = product.child;
  const children = (await readFile(`/proc/${pid}/task/${pid}/children`, 'utf8'))
    .trim()
    .split(' ')
    .map(Number);
  const database = findRunning(mariadbFiles(folder))?.pid;
  return children.filter((child) => child !== database);
}

test('when two processes serve, then both are there, on one database, and what one keeps the other shows', async () => {
  expect(await serverProcesses()).toHaveLength(2);
  const [first, second] = [await enterDemo(product.url), await enterDemo(product.url)];
  const id = await saveAs(first, 'Kept by one of two');
  expect((await studiesOf(second)).map((study) => study.id)).toContain(id);
  expect((await studiesOf(second)).filter(({ id: known }) => known === id)).toHaveLength(1);
});

test('when a server process is killed, then the program goes on and starts another', async () => {
  const before = await serverProcesses();
  const [victim] = before;
  process.kill(victim ?? 0, 'SIGKILL');
  await vi.waitFor(async () => {
    const now = await serverProcesses();
    expect(now).toHaveLength(2);
    expect(now).not.toContain(victim);
  }, PATIENCE);
  await vi.waitFor(async () => expect(await healthStatus(product.url)).toBe(200), PATIENCE);
  await enterDemo(product.url);
});

test('when the program is asked to stop, then its processes and its database end with it', async () => {
  const processes = await serverProcesses();
  const { code } = await product.end('SIGTERM');
  expect(code).toBe(0);
  for (const pid of processes) expect(() => process.kill(pid, 0)).toThrow(/ESRCH/);
  expect(findRunning(mariadbFiles(folder))).toBeUndefined();
});
