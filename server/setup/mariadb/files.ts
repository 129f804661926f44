import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';

/** Where one embedded database server keeps what it needs. */
export interface MariadbFiles {
  readonly data: string;
  readonly credentials: string;
  readonly pidFile: string;
  readonly log: string;
}

const SOCKET_FOLDER = join(tmpdir(), 'siltline-');

export function mariadbFiles(dataDir: string): MariadbFiles {
  return {
    data: join(dataDir, 'mariadb'),
    credentials: join(dataDir, 'mariadb-accounts.json'),
    pidFile: join(dataDir, 'mariadb.pid'),
    log: join(dataDir, 'mariadb.log'),
  };
}

/** A socket's path may have 107 bytes, so it lies in the temporary folder and not in the data folder. */
export async function makeSocketFolder(): Promise<{ socket: string; remove: () => Promise<void> }> {
  const folder = await mkdtemp(SOCKET_FOLDER);
  return { socket: join(folder, 'db'), remove: () => rm(folder, { recursive: true, force: true }) };
}

export function isSocketFolder(folder: string): boolean {
  return folder.startsWith(SOCKET_FOLDER) && dirname(folder) === tmpdir();
}
