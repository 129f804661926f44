import { createReadStream, createWriteStream } from 'node:fs';
import { rename, rm } from 'node:fs/promises';
import type { Readable } from 'node:stream';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { createGunzip, createGzip } from 'node:zlib';
import { z } from 'zod';
import type { DatabaseAccess } from '#server/db/access';
import type { Mode } from '#server/env';
import { runClient } from '#server/backups/client-programs';

const OWNER_ONLY = 0o600;
const MARK = '-- siltline backup ';
/** The last line of a whole dump. */
const END = /-- Dump completed/;
const LONGEST_HEAD = 2000;

const headSchema = z.object({
  format: z.literal(1),
  mode: z.enum(['demo', 'embedded', 'external']),
  version: z.string(),
  takenAt: z.iso.datetime(),
});
/** What the first line of a backup says of it. */
export type BackupHead = z.infer<typeof headSchema>;

/** The file is not a backup, or not a whole one; the message is for whoever runs the command. */
export class NotABackup extends Error {
  override readonly name = 'NotABackup';
}

/** All tables in one consistent reading, while the program goes on. */
const DUMP_OPTIONS = [
  '--single-transaction',
  '--quick',
  '--skip-lock-tables',
  '--no-tablespaces',
  '--hex-blob',
];

function headed(head: BackupHead): Transform {
  let begun = false;
  return new Transform({
    transform(part: Buffer, _encoding, done) {
      if (!begun) this.push(`${MARK}${JSON.stringify(head)}\n`);
      begun = true;
      done(null, part);
    },
  });
}

/** Writes the whole database into one file, which has its name only when it is whole. */
export async function writeBackup(access: DatabaseAccess, file: string, head: BackupHead): Promise<void> {
  const unfinished = `${file}.unfinished`;
  const dump = await runClient('mariadb-dump', access, DUMP_OPTIONS);
  try {
    await pipeline(
      dump.child.stdout,
      headed(head),
      createGzip(),
      createWriteStream(unfinished, { mode: OWNER_ONLY }),
    );
    await dump.ended;
    await rename(unfinished, file);
  } catch (error) {
    await rm(unfinished, { force: true });
    throw error;
  }
}

/**
 * @returns the statements of a backup, as they are read
 * @throws {NotABackup} while it is read, if the file is none
 */
export function readBackup(file: string): Readable {
  const text = createGunzip();
  createReadStream(file)
    .on('error', (error) => text.destroy(new NotABackup(`${file} cannot be read: ${error.message}.`)))
    .pipe(text);
  return text;
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

function headOf(file: string, text: string): BackupHead {
  const line = text.split('\n', 1)[0] ?? '';
  const head = headSchema.safeParse(line.startsWith(MARK) ? parsed(line.slice(MARK.length)) : null);
  if (!head.success) throw new NotABackup(`${file} is not a backup of Siltline.`);
  return head.data;
}

/**
 * Reads a backup through, to know what it is and that it is whole.
 * @throws {NotABackup}
 */
export async function inspectBackup(file: string): Promise<BackupHead> {
  let head = '';
  let tail = '';
  try {
    for await (const part of readBackup(file)) {
      const text = String(part);
      if (head.length < LONGEST_HEAD) head += text;
      tail = (tail + text).slice(-LONGEST_HEAD);
    }
  } catch (error) {
    if (error instanceof NotABackup) throw error;
    throw new NotABackup(`${file} is not a backup of Siltline, or is damaged.`, { cause: error });
  }
  const found = headOf(file, head);
  if (!END.test(tail)) throw new NotABackup(`${file} is cut off: its end is missing.`);
  return found;
}

/** Of the demo everybody knows the passwords. */
export function mayRestore(from: Mode, into: Mode): boolean {
  return (from === 'demo') === (into === 'demo');
}
