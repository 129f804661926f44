import {
  existsSync,
  mkdirSync,
  readdirSync,
  readlinkSync,
  renameSync,
  rmSync,
  statSync,
  symlinkSync,
} from 'node:fs';
import { join } from 'node:path';
import { lockHolder } from './process-lock.mjs';
import { ROOT } from './sources.mjs';

/** A folder for each build, and `current`, which points at the newest. */
export const DIST = join(ROOT, 'dist');
export const UNFINISHED = '.unfinished-';
const CURRENT = join(DIST, 'current');
const KEPT = 3;

export function isCurrent(hash) {
  try {
    return readlinkSync(CURRENT) === hash && existsSync(join(DIST, hash));
  } catch {
    return false;
  }
}

/** In one step, so that nobody finds none. */
export function pointCurrentAt(hash) {
  if (isCurrent(hash)) return;
  const next = join(DIST, `.current-${process.pid}`);
  rmSync(next, { force: true });
  symlinkSync(hash, next);
  renameSync(next, CURRENT);
}

/** A copy that runs from a build keeps a lock in it. */
function isRunning(build) {
  const leases = join(DIST, build, 'running');
  return existsSync(leases) && readdirSync(leases).some((lease) => lockHolder(join(leases, lease)));
}

/** Removes what an interrupted build left, and old builds but the newest few and those that run. */
export function prune(current) {
  mkdirSync(DIST, { recursive: true });
  const names = readdirSync(DIST).filter((name) => name !== 'current');
  const changed = (name) => statSync(join(DIST, name)).mtimeMs;
  const builds = names
    .filter((name) => !name.startsWith('.') && name !== current)
    .sort((a, b) => changed(b) - changed(a));
  const old = builds.slice(KEPT - 1).filter((build) => !isRunning(build));
  for (const name of [...names.filter((name) => name.startsWith('.')), ...old])
    rmSync(join(DIST, name), { recursive: true, force: true });
}
