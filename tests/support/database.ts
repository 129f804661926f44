import type { Pool, RowDataPacket } from 'mysql2/promise';
import { inject, onTestFinished } from 'vitest';
import { openDb, openPool, type Db } from '#server/db/connection';

/** A database without a row, and the connections to it. They close when the test is over. */
export interface TestDatabase {
  readonly pool: Pool;
  readonly db: Db;
}

/** Empties the API tests' database and opens it with the rights that the program has when it runs. */
export async function openTestDatabase(): Promise<TestDatabase> {
  await emptyTables();
  const pool = openPool(inject('database').app);
  onTestFinished(() => pool.end());
  return { pool, db: openDb(pool) };
}

async function emptyTables(): Promise<void> {
  const pool = openPool(inject('database').migration);
  const connection = await pool.getConnection();
  try {
    const [tables] = await connection.query<RowDataPacket[]>(
      "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_name <> '__drizzle_migrations'",
    );
    await connection.query('SET foreign_key_checks = 0');
    for (const { name } of tables) await connection.query('DELETE FROM ??', [name]);
  } finally {
    connection.destroy();
    await pool.end();
  }
}
