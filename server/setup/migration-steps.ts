import type { MigrationMeta } from 'drizzle-orm/migrator';
import type { Connection, RowDataPacket } from 'mysql2/promise';
import { isDoneAlready } from '#server/setup/done-already';

/** What the steps need of a connection. */
export type StepConnection = Pick<Connection, 'query'>;

/** As Drizzle's own runner makes it: what it has applied is applied. */
const APPLIED = `CREATE TABLE IF NOT EXISTS __drizzle_migrations (
  id serial PRIMARY KEY, hash text NOT NULL, created_at bigint)`;
/** How far a migration has come: statements begun and statements done. */
const STEPS = `CREATE TABLE IF NOT EXISTS __migration_steps (
  migration bigint PRIMARY KEY, begun int NOT NULL, done int NOT NULL) ENGINE=InnoDB`;

async function inOneTransaction(connection: StepConnection, work: () => Promise<void>): Promise<void> {
  await connection.query('START TRANSACTION');
  try {
    await work();
    await connection.query('COMMIT');
  } catch (error) {
    await connection.query('ROLLBACK').catch(() => undefined);
    throw error;
  }
}

async function newestApplied(connection: StepConnection): Promise<number> {
  const [rows] = await connection.query<RowDataPacket[]>(
    'SELECT MAX(created_at) AS newest FROM __drizzle_migrations',
  );
  return Number(rows[0]?.newest ?? -1);
}

interface Progress {
  readonly begun: number;
  readonly done: number;
}

async function readProgress(connection: StepConnection, migration: number): Promise<Progress> {
  await connection.query('INSERT IGNORE INTO __migration_steps VALUES (?, 0, 0)', [migration]);
  const [rows] = await connection.query<RowDataPacket[]>(
    'SELECT begun, done FROM __migration_steps WHERE migration = ?',
    [migration],
  );
  return { begun: Number(rows[0]?.begun ?? 0), done: Number(rows[0]?.done ?? 0) };
}

async function noteBegun(connection: StepConnection, migration: number, number: number): Promise<void> {
  await connection.query('UPDATE __migration_steps SET begun = ? WHERE migration = ?', [number, migration]);
}

/**
 * A statement that changes rows is undone with its record. One that changes tables commits by itself, so a kill may
 * fall between it and its record: only of the one that was under way it is taken that it was done.
 */
async function runStatement(
  connection: StepConnection,
  migration: number,
  { statement, number, wasUnderWay }: { statement: string; number: number; wasUnderWay: boolean },
): Promise<void> {
  await noteBegun(connection, migration, number);
  await inOneTransaction(connection, async () => {
    try {
      await connection.query(statement);
    } catch (error) {
      if (!wasUnderWay || !isDoneAlready(error)) throw error;
    }
    await connection.query('UPDATE __migration_steps SET done = ? WHERE migration = ?', [number, migration]);
  }).catch(async (error: unknown) => {
    // Refused, not killed: at the next start it must not pass for done.
    if (!wasUnderWay) await noteBegun(connection, migration, number - 1).catch(() => undefined);
    throw error;
  });
}

async function applyMigration(connection: StepConnection, migration: MigrationMeta): Promise<void> {
  const { folderMillis, hash, sql } = migration;
  const { begun, done } = await readProgress(connection, folderMillis);
  for (const [index, statement] of sql.entries()) {
    const number = index + 1;
    if (number <= done) continue;
    await runStatement(connection, folderMillis, { statement, number, wasUnderWay: number === begun });
  }
  await inOneTransaction(connection, async () => {
    await connection.query('INSERT INTO __drizzle_migrations (hash, created_at) VALUES (?, ?)', [
      hash,
      folderMillis,
    ]);
    await connection.query('DELETE FROM __migration_steps WHERE migration = ?', [folderMillis]);
  });
}

/** Applies what is not applied yet, statement by statement; killed anywhere, the next run goes on from there. */
export async function applyMigrations(
  connection: StepConnection,
  migrations: readonly MigrationMeta[],
): Promise<void> {
  await connection.query(APPLIED);
  await connection.query(STEPS);
  const newest = await newestApplied(connection);
  for (const migration of migrations)
    if (migration.folderMillis > newest) await applyMigration(connection, migration);
}
