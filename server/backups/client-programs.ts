import { spawn, type ChildProcessByStdio } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Readable, Writable } from 'node:stream';
import { isLoopback, type DatabaseAccess } from '#server/db/access';
import { findProgram } from '#server/setup/mariadb/programs';

const OWNER_ONLY = 0o600;

/** One of MariaDB's own programs at work on a database. */
export interface ClientProgram {
  readonly child: ChildProcessByStdio<Writable, Readable, Readable>;
  /** @throws {Error} with what it said, if it did not end well. */
  readonly ended: Promise<void>;
}

const quoted = (text: string): string => `"${text.replaceAll('\\', '\\\\').replaceAll('"', '\\"')}"`;

/** A command line can be read by everybody on the machine, a file of ours cannot. */
function optionFile({ user, password, socketPath, host, port }: DatabaseAccess): string {
  const place = socketPath
    ? [`socket=${quoted(socketPath)}`, 'protocol=socket']
    : [`host=${quoted(host ?? '')}`, `port=${port}`, 'protocol=tcp'];
  const encryption = host === undefined || isLoopback(host) ? [] : ['ssl-verify-server-cert'];
  const account = [`user=${quoted(user)}`, `password=${quoted(password)}`];
  return ['[client]', ...account, ...place, ...encryption, 'default-character-set=utf8mb4', ''].join('\n');
}

/**
 * Runs `mariadb` or `mariadb-dump` on a database.
 * @param options of the program; the database's name comes after them
 * @param tables of a dump; all where none is named
 */
export async function runClient(
  name: 'mariadb' | 'mariadb-dump',
  access: DatabaseAccess,
  options: readonly string[],
  tables: readonly string[] = [],
): Promise<ClientProgram> {
  const program = findProgram(name);
  const folder = await mkdtemp(join(tmpdir(), 'siltline-account-'));
  const file = join(folder, 'options.cnf');
  await writeFile(file, optionFile(access), { mode: OWNER_ONLY });
  const words = [`--defaults-file=${file}`, ...options, access.database, ...tables];
  const child = spawn(program, words, { stdio: ['pipe', 'pipe', 'pipe'] });
  let said = '';
  child.stderr.on('data', (part: Buffer) => (said += part.toString()));
  // Its exit says what was wrong; a pipe that closes before that says nothing more.
  child.stdin.on('error', () => undefined);
  const ended = once(child, 'close')
    .then(() => {
      if (child.exitCode !== 0)
        throw new Error(`${name} ended with ${child.exitCode ?? child.signalCode}: ${said}`);
    })
    .finally(() => rm(folder, { recursive: true, force: true }));
  ended.catch(() => undefined);
  return { child, ended };
}
