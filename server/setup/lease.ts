import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { isBuilt, productFolder } from '#server/setup/product';
import { tryLock } from './process-lock.mjs';

/** Says that this process runs from its build's folder, which is then not cleared away. @returns what ends it. */
export function leaseBuild(): () => void {
  if (!isBuilt) return () => undefined;
  const leases = join(productFolder, 'running');
  try {
    mkdirSync(leases, { recursive: true });
    return tryLock(join(leases, `${process.pid}`)) ?? (() => undefined);
  } catch {
    // A program installed where it may not write is not cleared away by us either.
    return () => undefined;
  }
}
