import { readFileSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import { dirname } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { isSocketFolder, type MariadbFiles } from '#server/setup/mariadb/files';

const POLL_MS = 50;
const PATIENCE_MS = 20_000;

/** A database server that runs on our files. */
export interface RunningMariadb {
  readonly pid: number;
  readonly socket: string;
}

/** @returns the server whose number the data folder holds, if it lives and its command line names our files. */
export function findRunning(files: Pick<MariadbFiles, 'data' | 'pidFile'>): RunningMariadb | undefined {
  try {
    const pid = Number(readFileSync(files.pidFile, 'utf8').trim());
    const words = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
    const socket = words.find((word) => word.startsWith('--socket='))?.slice('--socket='.length);
    return words.includes(`--datadir=${files.data}`) && socket ? { pid, socket } : undefined;
  } catch {
    return undefined;
  }
}

/** Stops what a killed program has left behind. The caller holds the data folder's lock. */
export async function stopLeftover(files: MariadbFiles): Promise<boolean> {
  const leftover = findRunning(files);
  if (!leftover) return false;
  process.kill(leftover.pid, 'SIGTERM');
  const deadline = Date.now() + PATIENCE_MS;
  while (findRunning(files)?.pid === leftover.pid) {
    if (Date.now() > deadline) process.kill(leftover.pid, 'SIGKILL');
    await pause(POLL_MS);
  }
  const folder = dirname(leftover.socket);
  if (isSocketFolder(folder)) await rm(folder, { recursive: true, force: true });
  return true;
}
