import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import type { DatabaseAccess } from '#server/db/access';
import { startEmbeddedMariadb } from '#server/setup/mariadb/embedded';
import { migrateDatabase } from '#server/setup/migration';

declare module 'vitest' {
  export interface ProvidedContext {
    /** The accounts of the database that the API tests share. */
    database: { app: DatabaseAccess; migration: DatabaseAccess };
  }
}

/** One real MariaDB for all API tests, with the very set-up code of the program; gone afterwards. */
export async function setup(project: TestProject): Promise<() => Promise<void>> {
  const folder = await mkdtemp(join(tmpdir(), 'siltline-tests-'));
  const database = await startEmbeddedMariadb(
    folder,
    {
      onLeftoverStopped: () => undefined,
      onDied: (how) => console.error(`The tests' database died: ${how}`),
      onRestarted: () => undefined,
    },
    'relaxed',
  );
  await migrateDatabase(database.migration);
  project.provide('database', { app: database.app, migration: database.migration });
  return async () => {
    await database.stop();
    await rm(folder, { recursive: true, force: true });
  };
}
