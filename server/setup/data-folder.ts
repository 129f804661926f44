import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { mkdir, readFile, rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Mode } from '#server/env';
import { lockHolder, tryLock } from './process-lock.mjs';

/** A reason not to start that the operator can mend; its message is all they need. */
export class CannotStart extends Error {
  override readonly name = 'CannotStart';
}

/** The data folder, held by this process alone. */
export interface DataFolder {
  /** The key that signs cookies: made once and kept. */
  readonly sessionSecret: string;
  release(): void;
}

const OWNER_ONLY = 0o600;
const FOLDER_OWNER_ONLY = 0o700;
const SECRET_BYTES = 32;

export function lockFile(dataDir: string): string {
  return join(dataDir, 'siltline.lock');
}

/**
 * Takes the data folder for this process, in this mode.
 * @throws {CannotStart} if it cannot be written, is in use, or holds the data of the other mode.
 */
export async function openDataFolder(dataDir: string, mode: Exclude<Mode, 'external'>): Promise<DataFolder> {
  const release = await lockFolder(dataDir);
  try {
    await claimFor(mode, dataDir);
    return { sessionSecret: await keptSecret(dataDir), release };
  } catch (error) {
    release();
    throw error;
  }
}

async function lockFolder(dataDir: string): Promise<() => void> {
  const lock = lockFile(dataDir);
  try {
    await mkdir(dataDir, { recursive: true, mode: FOLDER_OWNER_ONLY });
    const release = tryLock(lock);
    if (release) return release;
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    throw new CannotStart(`The data folder ${dataDir} cannot be written (${why}). Set DATA_DIR to another.`, {
      cause: error,
    });
  }
  const pid = lockHolder(lock)?.pid;
  const who = pid === undefined ? 'another copy of Siltline' : `another copy of Siltline (process ${pid})`;
  throw new CannotStart(
    `The data folder ${dataDir} is in use by ${who}. Stop that one, or give this one a DATA_DIR and PORT of its own.`,
  );
}

/** The demo's passwords are public and its mail page shows every mail: its data and real data must never mix. */
async function claimFor(mode: Exclude<Mode, 'external'>, dataDir: string): Promise<void> {
  const file = join(dataDir, 'mode');
  const held = existsSync(file) ? readFileSync(file, 'utf8').trim() : undefined;
  if (held === undefined) return writeWhole(file, `${mode}\n`);
  if (held === mode) return;
  if (mode === 'embedded')
    throw new CannotStart(
      `DEMO=off, but the data folder ${dataDir} holds the demo, whose passwords are public. Set DATA_DIR to another.`,
    );
  throw new CannotStart(
    `The data folder ${dataDir} was made with DEMO=off, and the demo would show its mail to anybody. ` +
      'Set DEMO=off again, or DATA_DIR to another.',
  );
}

async function keptSecret(dataDir: string): Promise<string> {
  const file = join(dataDir, 'session-secret');
  if (!existsSync(file)) await writeWhole(file, randomBytes(SECRET_BYTES).toString('base64url'));
  return readFile(file, 'utf8');
}

async function writeWhole(file: string, text: string): Promise<void> {
  await writeFile(`${file}.new`, text, { mode: OWNER_ONLY });
  await rename(`${file}.new`, file);
}
