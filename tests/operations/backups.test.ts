import { execFile } from 'node:child_process';
import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startProduct, type Product } from '../support/product';
import { enterDemo, saveAs, studiesOf } from '../support/running-demo';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));

let folder: string;
let product: Product;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'siltline-tests-'));
  product = await startProduct({ DATA_DIR: join(folder, 'data') });
});

afterAll(async () => {
  await product.end();
  await rm(folder, { recursive: true, force: true });
});

/** Runs a command as an operator would. @returns what it said; a refusal is an error that holds it */
async function run(name: 'backup' | 'restore', word: string, settings = {}): Promise<string> {
  const words = ['--import', 'tsx', `server/backups/${name}.ts`, word];
  const { PATH, HOME } = process.env;
  const env = { PATH, HOME, DATA_DIR: join(folder, 'data'), ...settings };
  return (await promisify(execFile)(process.execPath, words, { cwd: ROOT, env })).stdout;
}

/** @returns the one file that a backup has left in a folder of its own */
async function backUp(name: string): Promise<string> {
  const target = join(folder, name);
  expect(await run('backup', target)).toContain('Tried out: loaded into an empty database');
  const files = await readdir(target);
  expect(files).toHaveLength(1);
  return join(target, files[0] ?? '');
}

async function titles(): Promise<readonly string[]> {
  return (await studiesOf(await enterDemo(product.url))).map(({ title }) => title);
}

test('when a backup is restored while the program runs, then it holds what it held then and everybody is signed out', async () => {
  const caller = await enterDemo(product.url);
  await saveAs(caller, 'Before the backup');
  const file = await backUp('first');
  await saveAs(caller, 'After the backup');
  expect(await titles()).toContain('After the backup');

  expect(await run('restore', file)).toContain('compared with the backup');
  expect((await caller.get('/api/studies')).status).toBe(401);
  const found = await titles();
  expect(found).toContain('Before the backup');
  expect(found).not.toContain('After the backup');
});

test('when a backup is cut off, then nothing is restored from it', async () => {
  const file = await backUp('second');
  const cut = join(folder, 'cut.sql.gz');
  const whole = await readFile(file);
  await writeFile(cut, whole.subarray(0, whole.length / 2));
  await saveAs(await enterDemo(product.url), 'After the second backup');
  await expect(run('restore', cut)).rejects.toThrow(/is damaged|is cut off/);
  expect(await titles()).toContain('After the second backup');
});

test('when something else is given as a backup, then it is refused', async () => {
  const other = join(folder, 'letter.txt');
  await writeFile(other, 'Dear all, the tide is out.');
  await expect(run('restore', other)).rejects.toThrow('is not a backup of Siltline');
  await expect(run('restore', join(folder, 'nothing.sql.gz'))).rejects.toThrow('cannot be read');
});

test('when a backup of the demo is to be restored in earnest, then it is refused', async () => {
  const inEarnest = {
    DEMO: 'off',
    DATA_DIR: join(folder, 'earnest'),
    PUBLIC_URL: 'https://siltline.example',
    SMTP_URL: 'smtp://127.0.0.1:9',
    MAIL_FROM: 'siltline@siltline.example',
  };
  await expect(run('restore', await backUp('third'), inEarnest)).rejects.toThrow('do not mix');
});
