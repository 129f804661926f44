import type { Logger } from 'pino';
import type { DatabaseAccess } from '#server/db/access';
import type { Settings } from '#server/env';
import { CannotStart, openDataFolder } from '#server/setup/data-folder';
import { startEmbeddedMariadb } from '#server/setup/mariadb/embedded';
import type { MariadbEvents } from '#server/setup/mariadb/supervisor';

/** The database that the settings name, ready for use, and what has to be undone at the end. */
export interface OpenedDatabase {
  readonly app: DatabaseAccess;
  readonly migration: DatabaseAccess;
  readonly sessionSecret: string;
  stop(): Promise<void>;
}

function logEvents(log: Logger): MariadbEvents {
  return {
    onLeftoverStopped: () => log.warn('a database server that a killed program left running was stopped'),
    onDied: (how) => log.error({ how }, 'the database server died; it is being started again'),
    onRestarted: () => log.info('the database server runs again'),
  };
}

/** @throws {CannotStart} if the data folder cannot be used. */
export async function openDatabase(settings: Settings, log: Logger): Promise<OpenedDatabase> {
  const { mode, database, migrationDatabase, sessionSecret } = settings;
  if (mode !== 'external') return openEmbedded(settings.dataDir, mode, sessionSecret, log);
  if (!database || !migrationDatabase || !sessionSecret)
    throw new CannotStart('DATABASE_URL and SESSION_SECRET are needed.');
  return { app: database, migration: migrationDatabase, sessionSecret, stop: () => Promise.resolve() };
}

async function openEmbedded(
  dataDir: string,
  mode: 'demo' | 'embedded',
  sessionSecret: string | undefined,
  log: Logger,
): Promise<OpenedDatabase> {
  const folder = await openDataFolder(dataDir, mode);
  try {
    const mariadb = await startEmbeddedMariadb(dataDir, logEvents(log));
    return {
      app: mariadb.app,
      migration: mariadb.migration,
      sessionSecret: sessionSecret ?? folder.sessionSecret,
      stop: () => mariadb.stop().finally(folder.release),
    };
  } catch (error) {
    folder.release();
    throw error;
  }
}
