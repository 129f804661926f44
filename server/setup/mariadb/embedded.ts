import type { DatabaseAccess } from '#server/db/access';
import { CannotStart } from '#server/setup/data-folder';
import { DATABASE } from '#server/setup/mariadb/accounts';
import { makeSocketFolder, mariadbFiles } from '#server/setup/mariadb/files';
import { initialiseMariadb } from '#server/setup/mariadb/initialise';
import { stopLeftover } from '#server/setup/mariadb/leftover';
import { spawnMariadb, type Durability } from '#server/setup/mariadb/process';
import { supervise, type MariadbEvents } from '#server/setup/mariadb/supervisor';

/** A database server of the program's own. */
export interface EmbeddedMariadb {
  readonly app: DatabaseAccess;
  readonly migration: DatabaseAccess;
  stop(): Promise<void>;
}

/**
 * Makes the database if there is none, ends what a killed program left running, and starts the server. The caller
 * holds the data folder's lock.
 * @throws {CannotStart} naming the log, if it cannot be started.
 */
export async function startEmbeddedMariadb(
  dataDir: string,
  events: MariadbEvents,
  durability: Durability = 'full',
): Promise<EmbeddedMariadb> {
  const files = mariadbFiles(dataDir);
  const { socket, remove } = await makeSocketFolder();
  try {
    if (await stopLeftover(files)) events.onLeftoverStopped();
    const { app, migration } = await initialiseMariadb(files);
    const place = { database: DATABASE, socketPath: socket };
    const start = () => spawnMariadb(files, socket, durability);
    const stop = await supervise(start, { ...app, ...place }, events);
    return {
      app: { ...app, ...place },
      migration: { ...migration, ...place },
      stop: () => stop().finally(remove),
    };
  } catch (error) {
    await remove();
    throw new CannotStart(`The database cannot be started; ${files.log} says why.`, { cause: error });
  }
}
