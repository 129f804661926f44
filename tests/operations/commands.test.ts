import { execFile } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { createCaller } from '../support/caller';
import { freePort } from '../support/port';
import { startProduct, type Product } from '../support/product';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const PASSWORD = 'the lower gate at low water';

let settings: Record<string, string> & { DATA_DIR: string };
let product: Product | undefined;

beforeAll(async () => {
  const port = String(await freePort());
  settings = {
    DEMO: 'off',
    DATA_DIR: await mkdtemp(join(tmpdir(), 'siltline-tests-')),
    PORT: port,
    PUBLIC_URL: `http://localhost:${port}`,
    SMTP_URL: 'smtp://127.0.0.1:9',
    MAIL_FROM: 'siltline@siltline.example',
  };
});
afterAll(async () => {
  await product?.end();
  await rm(settings.DATA_DIR, { recursive: true, force: true });
});

async function createAdministrator(email: string): Promise<string> {
  const words = ['--import', 'tsx', 'server/accounts/create-admin.ts', email, 'Somebody New'];
  const { PATH, HOME } = process.env;
  const env = { PATH, HOME, ...settings, ADMIN_PASSWORD: PASSWORD };
  return (await promisify(execFile)(process.execPath, words, { cwd: ROOT, env })).stdout;
}

async function signIn(email: string): Promise<unknown> {
  const caller = createCaller(product?.url ?? '');
  const answer = await caller.post('/api/session', { email, password: PASSWORD });
  return answer.json();
}

test('when an administrator is made before the program runs and while it runs, then both can sign in', async () => {
  expect(await createAdministrator('first@saltern.example')).toContain('is an administrator now');
  product = await startProduct(settings);
  expect(await createAdministrator('second@saltern.example')).toContain('is an administrator now');
  for (const email of ['first@saltern.example', 'second@saltern.example'])
    expect(await signIn(email)).toMatchObject({ account: { email, role: 'administrator' } });
});
