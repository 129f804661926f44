import { existsSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { mariadbFiles } from '#server/setup/mariadb/files';
import { findRunning } from '#server/setup/mariadb/leftover';
import { freePort } from '../support/port';
import { healthStatus, runToEnd, startProduct, type Product } from '../support/product';

const IN_EARNEST = {
  DEMO: 'off',
  PUBLIC_URL: 'https://siltline.example',
  SMTP_URL: 'smtp://127.0.0.1:9',
  MAIL_FROM: 'Siltline <siltline@siltline.example>',
};

let folder: string;
let first: Product;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'siltline-tests-'));
  first = await startProduct({ DATA_DIR: folder });
});

afterAll(async () => {
  await first.end();
  await rm(folder, { recursive: true, force: true });
});

test('when a second copy is started on a data folder in use, then it refuses and the first is unharmed', async () => {
  const database = findRunning(mariadbFiles(folder));
  const { code, output } = await runToEnd({ DATA_DIR: folder });
  expect(code).toBe(1);
  expect(output).toBe(
    `The data folder ${folder} is in use by another copy of Siltline (process ${first.child.pid}). ` +
      'Stop that one, or give this one a DATA_DIR and PORT of its own.\n',
  );
  expect(await healthStatus(first.url)).toBe(200);
  expect(database).toBeDefined();
  expect(findRunning(mariadbFiles(folder))).toEqual(database);
});

test('when a second copy has a data folder and a port of its own, then both run side by side', async () => {
  const other = await mkdtemp(join(tmpdir(), 'siltline-tests-'));
  const second = await startProduct({ DATA_DIR: other });
  expect(await healthStatus(first.url)).toBe(200);
  expect(await healthStatus(second.url)).toBe(200);
  await second.end();
  await rm(other, { recursive: true, force: true });
  expect(await healthStatus(first.url)).toBe(200);
});

test('when a second copy has the port of the first, then it says so and makes nothing', async () => {
  const other = join(folder, 'never-made');
  const port = new URL(first.url).port;
  const { code, output } = await runToEnd({ DATA_DIR: other, PORT: port });
  expect(code).toBe(1);
  expect(output).toContain(`Cannot listen on 127.0.0.1:${port}: another program listens there`);
  expect(existsSync(other)).toBe(false);
});

test('when the program is stopped, then it ends well, its database too, and its lock is gone', async () => {
  const database = findRunning(mariadbFiles(folder));
  expect(database).toBeDefined();
  const { code, signal } = await first.end('SIGTERM');
  expect({ code, signal }).toEqual({ code: 0, signal: null });
  expect(findRunning(mariadbFiles(folder))).toBeUndefined();
  expect(existsSync(`/proc/${database?.pid}`)).toBe(false);
  expect(existsSync(database?.socket ?? folder)).toBe(false);
  expect(existsSync(join(folder, 'siltline.lock'))).toBe(false);
});

test('when DEMO=off meets a folder that holds the demo, then it refuses', async () => {
  const { code, output } = await runToEnd({ ...IN_EARNEST, DATA_DIR: folder });
  expect(code).toBe(1);
  expect(output).toContain('holds the demo');
  expect(findRunning(mariadbFiles(folder))).toBeUndefined();
});

test('when the demo meets a folder made with DEMO=off, then it refuses', async () => {
  const earnest = await mkdtemp(join(tmpdir(), 'siltline-tests-'));
  const inEarnest = await startProduct({ ...IN_EARNEST, DATA_DIR: earnest });
  expect((await fetch(`${inEarnest.url}/api/demo/mails`, { redirect: 'manual' })).status).not.toBe(200);
  await inEarnest.end();
  const { code, output } = await runToEnd({ DATA_DIR: earnest });
  expect(code).toBe(1);
  expect(output).toContain('was made with DEMO=off');
  await rm(earnest, { recursive: true, force: true });
});

test('when the data folder cannot be written, then the program says so and ends', async () => {
  // The kernel's own tree takes no folders, not even from root.
  const { code, output } = await runToEnd({ DATA_DIR: '/sys/siltline', PORT: String(await freePort()) });
  expect(code).toBe(1);
  expect(output).toContain('The data folder /sys/siltline cannot be written');
});
