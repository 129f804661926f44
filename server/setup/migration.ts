import { existsSync } from 'node:fs';
import { drizzle } from 'drizzle-orm/mysql2';
import { migrate } from 'drizzle-orm/mysql2/migrator';
import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { connectionOptions, type DatabaseAccess } from '#server/db/access';
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
  const connection = await createConnection(connectionOptions(access));
  try {
    await lockMigrations(connection);
    await migrate(drizzle({ client: connection }), { migrationsFolder });
  } finally {
    // Ends the session, and with it the lock.
    await connection.end();
  }
}

async function lockMigrations(connection: Connection): Promise<void> {
  const [rows] = await connection.query<RowDataPacket[]>('SELECT GET_LOCK(?, ?) AS got', [
    LOCK_NAME,
    LOCK_WAIT_S,
  ]);
  if (rows[0]?.got !== 1) throw new Error('Another copy has been changing the tables for too long.');
}
