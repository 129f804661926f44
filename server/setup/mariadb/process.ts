import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { closeSync, openSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';
import { createConnection } from 'mysql2/promise';
import { connectionOptions, type DatabaseAccess } from '#server/db/access';
import type { MariadbFiles } from '#server/setup/mariadb/files';
import { asRoot, findProgram } from '#server/setup/mariadb/programs';

/** What may be lost when the machine (not the program) stops: nothing, or in tests the last second. */
export type Durability = 'full' | 'relaxed';

const POLL_MS = 50;
/** Recovery after a crash reads the redo log (16 MiB to begin with): seconds, and on a slow disk minutes. */
const MAX_START_MS = 180_000;
const MAX_STOP_MS = 20_000;
const OWNER_ONLY = 0o600;

/** Detached: Ctrl-C in a terminal must reach the program alone, which then stops the database in order. */
export function spawnMariadb(files: MariadbFiles, socket: string, durability: Durability): ChildProcess {
  const log = openSync(files.log, 'a', OWNER_ONLY);
  const child = spawn(findProgram('mariadbd'), serverOptions(files, socket, durability), {
    detached: true,
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  return child;
}

function serverOptions(files: MariadbFiles, socket: string, durability: Durability): string[] {
  return [
    '--no-defaults',
    ...asRoot(),
    `--datadir=${files.data}`,
    `--socket=${socket}`,
    `--pid-file=${files.pidFile}`,
    '--skip-networking',
    '--skip-name-resolve',
    '--skip-log-bin',
    '--local-infile=0',
    '--character-set-server=utf8mb4',
    '--collation-server=utf8mb4_unicode_ci',
    '--default-time-zone=+00:00',
    ...(durability === 'relaxed' ? ['--innodb-flush-log-at-trx-commit=0', '--innodb-doublewrite=0'] : []),
  ];
}

/** @throws {Error} if the server ends, or does not answer in time. */
export async function untilAnswering(child: ChildProcess, access: DatabaseAccess): Promise<void> {
  const deadline = Date.now() + MAX_START_MS;
  let failure: Error | undefined;
  child.once('error', (error) => (failure = error));
  while (Date.now() < deadline) {
    if (failure) throw failure;
    if (hasEnded(child)) throw new Error('The database server ended as it started.');
    if (await answers(access)) return;
    await pause(POLL_MS);
  }
  throw new Error('The database server does not answer.');
}

async function answers(access: DatabaseAccess): Promise<boolean> {
  try {
    const connection = await createConnection(connectionOptions(access));
    await connection.end();
    return true;
  } catch {
    return false;
  }
}

function hasEnded(child: ChildProcess): boolean {
  return child.pid === undefined || child.exitCode !== null || child.signalCode !== null;
}

export async function untilEnded(child: ChildProcess): Promise<void> {
  if (!hasEnded(child)) await once(child, 'exit');
}

/** Lets it write down everything; one that hangs is ended, which its redo log survives. */
export async function stopMariadb(child: ChildProcess): Promise<void> {
  child.kill('SIGTERM');
  const timer = setTimeout(() => child.kill('SIGKILL'), MAX_STOP_MS);
  await untilEnded(child);
  clearTimeout(timer);
}
