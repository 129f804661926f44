import { existsSync } from 'node:fs';
import { readMigrationFiles } from 'drizzle-orm/migrator';
import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { connectionOptions, type DatabaseAccess } from '#server/db/access';
import { CannotStart } from '#server/setup/data-folder';
import { applyMigrations } from '#server/setup/migration-steps';
import { migrationsFolder } from '#server/setup/product';

const LOCK_NAME = 'siltline.migration';
/** Longer than any one migration should take: whoever starts second waits for the first. */
const LOCK_WAIT_S = 120;

/**
 * Brings the tables up to date, as the account that may. Of several copies that start at once one migrates, and the
 * others wait.
 */
export async function migrateDatabase(access: DatabaseAccess): Promise<void> {
  if (!existsSync(migrationsFolder)) throw new Error(`There are no migrations in ${migrationsFolder}.`);
  const connection = await connect(access);
  try {
    await lockMigrations(connection);
    await applyMigrations(connection, readMigrationFiles({ migrationsFolder }));
  } finally {
    // Ends the session, and with it the lock.
    await connection.end();
  }
}

/** @throws {CannotStart} naming the database, without its password. */
async function connect(access: DatabaseAccess): Promise<Connection> {
  try {
    return await createConnection(connectionOptions(access));
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? String(error.code) : String(error);
    const place = access.socketPath ?? `${access.host}:${access.port}`;
    const whom = `${access.user} of ${access.database} at ${place}`;
    throw new CannotStart(`The database cannot be reached as ${whom} (${code}).`, { cause: error });
  }
}

async function lockMigrations(connection: Connection): Promise<void> {
  const [rows] = await connection.query<RowDataPacket[]>('SELECT GET_LOCK(?, ?) AS got', [
    LOCK_NAME,
    LOCK_WAIT_S,
  ]);
  if (rows[0]?.got !== 1) throw new Error('Another copy has been changing the tables for too long.');
}
