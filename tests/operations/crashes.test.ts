import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { listDemoPeople } from '#shared/contracts/demo';
import { listStudies, studySchema } from '#shared/contracts/studies';
import { mariadbFiles } from '#server/setup/mariadb/files';
import { findRunning } from '#server/setup/mariadb/leftover';
import { createCaller, type Caller } from '../support/caller';
import { healthStatus, startProduct, type Product } from '../support/product';

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

/** Somebody signed in to the demo as its composer. */
async function enter(): Promise<Caller> {
  const caller = createCaller(product.url);
  const { people } = listDemoPeople.response.parse(await (await caller.get('/api/demo/people')).json());
  const composer = people.find(({ role }) => role === 'composer');
  const { email, password } = composer ?? {};
  expect((await caller.post('/api/session', { email, password })).status).toBe(200);
  return caller;
}

async function studiesOf(caller: Caller) {
  return listStudies.response.parse(await (await caller.get('/api/studies?limit=50')).json()).studies;
}

/** Saves a study under a title, made from one that the demo has. */
async function saveAs(caller: Caller, title: string): Promise<string> {
  const [some] = await studiesOf(caller);
  const document = { ...some?.document, title };
  const answer = await caller.post('/api/studies', { document, requestKey: randomUUID() });
  expect(answer.status).toBe(200);
  return studySchema.parse(await answer.json()).id;
}

function killDatabase(): number {
  const running = findRunning(mariadbFiles(folder));
  if (!running) throw new Error('The database does not run.');
  process.kill(running.pid, 'SIGKILL');
  return running.pid;
}

test('when the database is killed, then the program answers 503, starts it again and has lost nothing', async () => {
  const caller = await enter();
  const id = await saveAs(caller, 'Before the database was killed');
  const killed = killDatabase();
  await vi.waitFor(async () => expect(await healthStatus(product.url)).toBe(503), PATIENCE);
  await vi.waitFor(async () => expect(await healthStatus(product.url)).toBe(200), PATIENCE);
  expect(findRunning(mariadbFiles(folder))?.pid).not.toBe(killed);
  expect((await studiesOf(caller)).map((study) => study.id)).toContain(id);
});

test('when the program is killed, then the next start stops what it left and has lost nothing', async () => {
  const id = await saveAs(await enter(), 'Before the program was killed');
  await product.end('SIGKILL');
  const leftover = findRunning(mariadbFiles(folder));
  expect(leftover).toBeDefined();

  product = await startProduct({ DATA_DIR: folder });
  expect(product.output()).toContain('a killed program left running was stopped');
  expect(findRunning(mariadbFiles(folder))?.pid).not.toBe(leftover?.pid);
  expect((await studiesOf(await enter())).map((study) => study.id)).toContain(id);
});

test('when both are killed, then the next start has lost nothing', async () => {
  const id = await saveAs(await enter(), 'Before both were killed');
  const ended = product.end('SIGKILL');
  killDatabase();
  await ended;

  product = await startProduct({ DATA_DIR: folder });
  expect((await studiesOf(await enter())).map((study) => study.id)).toContain(id);
});
