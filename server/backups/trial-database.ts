import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import type { DatabaseAccess } from '#server/db/access';
import { readBackup } from '#server/backups/backup-file';
import { runClient } from '#server/backups/client-programs';
import { startEmbeddedMariadb } from '#server/setup/mariadb/embedded';
import { migrateDatabase } from '#server/setup/migration';

const quiet = { onLeftoverStopped: () => undefined, onDied: () => undefined, onRestarted: () => undefined };

/** A file may tell the client to run programs; of a backup nothing but statements is wanted. Older clients pass it over. */
const STATEMENTS_ONLY = '--loose-sandbox';

/**
 * Loads a backup into a database server of its own, which is gone afterwards, and brings its tables up to date.
 * @param work is given the account that may do everything there
 */
export async function inTrialDatabase<T>(
  file: string,
  work: (access: DatabaseAccess) => Promise<T>,
): Promise<T> {
  const folder = await mkdtemp(join(tmpdir(), 'siltline-trial-'));
  try {
    const { migration, stop } = await startEmbeddedMariadb(folder, quiet, 'relaxed');
    try {
      const client = await runClient('mariadb', migration, ['--batch', STATEMENTS_ONLY]);
      await pipeline(readBackup(file), client.child.stdin);
      await client.ended;
      await migrateDatabase(migration);
      return await work(migration);
    } finally {
      await stop();
    }
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
