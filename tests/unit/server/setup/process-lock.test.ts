import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { lockHolder, tryLock, withLock } from '../../../../server/setup/process-lock.mjs';

const MODULE = fileURLToPath(new URL('../../../../server/setup/process-lock.mjs', import.meta.url));
const MINUTE_S = 60;

let folder: string;
let file: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'siltline-tests-'));
  file = join(folder, 'lock');
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

/** Another process takes the lock and ends without giving it back. */
function takeAndDie(): string {
  const script = `import { tryLock } from ${JSON.stringify(MODULE)}; console.log(!!tryLock(${JSON.stringify(file)}))`;
  return spawnSync(process.execPath, ['--input-type=module', '-e', script]).stdout.toString().trim();
}

test('when the lock is free, then it is had, names its holder and can be given back', () => {
  const release = tryLock(file);
  expect(lockHolder(file)).toEqual({ pid: process.pid });
  release?.();
  expect(lockHolder(file)).toBeUndefined();
  expect(readdirSync(folder)).toEqual([]);
});

test('when somebody living holds the lock, then nobody else gets it', () => {
  tryLock(file);
  expect(tryLock(file)).toBeUndefined();
  expect(takeAndDie()).toBe('false');
});

test('when the holder died, then the next one gets the lock', () => {
  expect(takeAndDie()).toBe('true');
  expect(existsSync(file)).toBe(true);
  expect(lockHolder(file)).toBeUndefined();
  expect(tryLock(file)).toBeDefined();
  expect(readdirSync(folder)).toEqual(['lock']);
});

test('when the number of a dead holder was given to another process, then the lock is free', () => {
  writeFileSync(file, JSON.stringify({ pid: process.pid, start: 'an earlier boot 1' }));
  expect(lockHolder(file)).toBeUndefined();
  expect(tryLock(file)).toBeDefined();
});

test('when a lock cannot be read, then it holds until it is old', () => {
  writeFileSync(file, '');
  expect(tryLock(file)).toBeUndefined();
  const before = Date.now() / 1000 - MINUTE_S;
  utimesSync(file, before, before);
  expect(tryLock(file)).toBeDefined();
});

test('when two want the lock, then the second works after the first, and hears of it', async () => {
  const order: string[] = [];
  const heard: number[] = [];
  let finishFirst = () => {};
  const first = withLock(
    file,
    () => undefined,
    () =>
      new Promise<void>((resolve) => {
        order.push('first begins');
        finishFirst = resolve;
      }).then(() => order.push('first ends')),
  );
  const second = withLock(
    file,
    (pid) => {
      heard.push(pid);
      finishFirst();
    },
    () => order.push('second'),
  );
  await Promise.all([first, second]);
  expect(order).toEqual(['first begins', 'first ends', 'second']);
  expect(heard).toEqual([process.pid]);
});

test('when the work fails, then the lock is given back', async () => {
  const failing = withLock(
    file,
    () => undefined,
    () => Promise.reject(new Error('no')),
  );
  await expect(failing).rejects.toThrow('no');
  expect(existsSync(file)).toBe(false);
});
