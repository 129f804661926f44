import type { RowDataPacket } from 'mysql2/promise';
import { afterAll, inject } from 'vitest';
import { openDb, openPool } from '#server/db/connection';

/** The API tests' database, with the rights that the program has when it runs. */
export const pool = openPool(inject('database').app);
export const db = openDb(pool);

afterAll(() => pool.end());

/** Removes every row; what each test needs it makes itself. */
export async function emptyTables(): Promise<void> {
  const connection = await pool.getConnection();
  try {
    const [tables] = await connection.query<RowDataPacket[]>(
      "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_name <> '__drizzle_migrations'",
    );
    await connection.query('SET foreign_key_checks = 0');
    for (const { name } of tables) await connection.query('DELETE FROM ??', [name]);
  } finally {
    // It would check no foreign keys for whoever got it next.
    connection.destroy();
  }
}
