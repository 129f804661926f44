import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startProduct } from './product';

/** The built program for the browser tests, with a data folder of its own; gone afterwards. */
async function startForBrowser(): Promise<() => Promise<void>> {
  const folder = await mkdtemp(join(tmpdir(), 'siltline-tests-'));
  const product = await startProduct({ DATA_DIR: folder });
  process.env.E2E_URL = product.url;
  return async () => {
    await product.end();
    await rm(folder, { recursive: true, force: true });
  };
}

// The runner takes the set-up from the default export alone.
export { startForBrowser as default };
