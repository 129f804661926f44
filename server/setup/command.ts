import { readFile } from 'node:fs/promises';
import { pino } from 'pino';
import type { DatabaseAccess } from '#server/db/access';
import { openDb, openPool, type Db } from '#server/db/connection';
import type { Settings } from '#server/env';
import { lockFile } from '#server/setup/data-folder';
import { openDatabase } from '#server/setup/database';
import { credentialsSchema, DATABASE } from '#server/setup/mariadb/accounts';
import { mariadbFiles } from '#server/setup/mariadb/files';
import { findRunning } from '#server/setup/mariadb/leftover';
import { migrateDatabase } from '#server/setup/migration';
import { lockHolder } from './process-lock.mjs';

/** The database as its two accounts reach it: the one that serves requests, and the one that may change tables. */
export interface CommandAccess {
  readonly app: DatabaseAccess;
  readonly migration: DatabaseAccess;
}

/**
 * Gives a command the database that the settings name, as the program has it: beside the running program, or, if the
 * embedded database does not run, by starting it for as long as the work takes.
 */
export async function withAccess<T>(
  settings: Settings,
  work: (access: CommandAccess) => Promise<T>,
): Promise<T> {
  const running = settings.mode === 'external' ? undefined : await findAccess(settings.dataDir);
  if (running) return work(running);
  const database = await openDatabase(settings, pino({ level: 'silent' }));
  try {
    await migrateDatabase(database.migration);
    return await work(database);
  } finally {
    await database.stop();
  }
}

/** The same for what only reads and writes rows. */
export function withDatabase<T>(settings: Settings, work: (db: Db) => Promise<T>): Promise<T> {
  return withAccess(settings, ({ app }) => withPool(app, work));
}

/** @returns how to reach the database that a running program has started. */
async function findAccess(dataDir: string): Promise<CommandAccess | undefined> {
  const files = mariadbFiles(dataDir);
  const running = lockHolder(lockFile(dataDir)) && findRunning(files);
  if (!running) return undefined;
  const { app, migration } = credentialsSchema.parse(JSON.parse(await readFile(files.credentials, 'utf8')));
  const place = { database: DATABASE, socketPath: running.socket };
  return { app: { ...app, ...place }, migration: { ...migration, ...place } };
}

async function withPool<T>(access: DatabaseAccess, work: (db: Db) => Promise<T>): Promise<T> {
  const pool = openPool(access);
  try {
    return await work(openDb(pool));
  } finally {
    await pool.end();
  }
}
