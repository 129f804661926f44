import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { drizzle } from 'drizzle-orm/mysql2';
import { readMigrationFiles, type MigrationMeta } from 'drizzle-orm/migrator';
import { migrate } from 'drizzle-orm/mysql2/migrator';
import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { connectionOptions } from '#server/db/access';
import { startEmbeddedMariadb, type EmbeddedMariadb } from '#server/setup/mariadb/embedded';
import { migrateDatabase } from '#server/setup/migration';
import { applyMigrations, type StepConnection } from '#server/setup/migration-steps';
import { migrationsFolder } from '#server/setup/product';

const MIGRATIONS = readMigrationFiles({ migrationsFolder });
const EVENTS = { onLeftoverStopped: () => undefined, onDied: () => undefined, onRestarted: () => undefined };

let folder: string;
let database: EmbeddedMariadb;
let connection: Connection;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'siltline-tests-'));
  database = await startEmbeddedMariadb(folder, EVENTS, 'relaxed');
  connection = await createConnection(connectionOptions(database.migration));
});

afterAll(async () => {
  await connection.end();
  await database.stop();
  await rm(folder, { recursive: true, force: true });
});

async function tables(): Promise<string[]> {
  const [rows] = await connection.query<RowDataPacket[]>(
    'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() ORDER BY 1',
  );
  return rows.map(({ name }) => String(name));
}

/** The tables as the database describes them, which is what a migration is for. */
async function structure(): Promise<string[]> {
  const described: string[] = [];
  for (const name of (await tables()).filter((table) => !table.startsWith('__'))) {
    const [rows] = await connection.query<RowDataPacket[]>('SHOW CREATE TABLE ??', [name]);
    described.push(String(rows[0]?.['Create Table']));
  }
  return described;
}

async function dropAll(): Promise<void> {
  await connection.query('SET foreign_key_checks = 0');
  for (const name of await tables()) await connection.query('DROP TABLE ??', [name]);
  await connection.query('SET foreign_key_checks = 1');
}

beforeEach(dropAll);

/** Dies at the nth thing said to the database: unheard, or heard with the answer lost. */
function dyingAt(turn: number, heard: boolean): { at: StepConnection; said: () => number; words: string[] } {
  let said = 0;
  const words: string[] = [];
  // The one cast: the driver's overloads come down to this call, which the steps alone make.
  const query = (async (statement: string, values?: unknown[]) => {
    said += 1;
    words.push(statement);
    if (said > turn) throw new Error('dead');
    if (said === turn && !heard) throw new Error('killed');
    const answer = await connection.query(statement, values);
    if (said === turn) throw new Error('killed');
    return answer;
  }) as StepConnection['query'];
  return { at: { query }, said: () => said, words };
}

/** What ends with a process is its open transaction. */
async function killedAt(turn: number, heard: boolean, migrations = MIGRATIONS): Promise<void> {
  await expect(applyMigrations(dyingAt(turn, heard).at, migrations)).rejects.toThrow('killed');
  await connection.query('ROLLBACK');
}

async function wholeRun(): Promise<{ said: number; words: string[]; structure: string[] }> {
  const counted = dyingAt(Number.POSITIVE_INFINITY, true);
  await applyMigrations(counted.at, MIGRATIONS);
  return { said: counted.said(), words: counted.words, structure: await structure() };
}

test.each([
  ['before a statement reaches the database', false],
  ['after it, with its answer unheard', true],
])(
  'when the first migration is killed %s, then the next start ends with the same tables',
  async (_when, heard) => {
    const whole = await wholeRun();
    // A table, a foreign key and an index under way, a record, and the last word of all.
    const kinds = [/^CREATE TABLE `/, /^ALTER TABLE/, /^CREATE INDEX/, /SET done/];
    const turns = kinds.map((kind) => whole.words.findIndex((words) => kind.test(words.trim())) + 1);
    expect(Math.min(...turns)).toBeGreaterThan(0);
    for (const turn of [...turns, whole.said]) {
      await dropAll();
      await killedAt(turn, heard);
      await migrateDatabase(database.migration);
      expect(await structure()).toEqual(whole.structure);
    }
  },
);

test('when it is killed again and again, then it gets on all the same', async () => {
  const whole = await wholeRun();
  await dropAll();
  let starts = 0;
  const step = 40;
  for (let turn = step; turn < whole.said; turn += step) {
    const killed = await applyMigrations(dyingAt(step, true).at, MIGRATIONS).catch((error: unknown) => error);
    await connection.query('ROLLBACK');
    starts += 1;
    if (killed === undefined) break;
  }
  expect(starts).toBeGreaterThan(1);
  await migrateDatabase(database.migration);
  expect(await structure()).toEqual(whole.structure);
});

test('when Drizzle’s own runner has applied it, then it is applied', async () => {
  await migrate(drizzle({ client: connection }), { migrationsFolder });
  const before = await structure();
  await migrateDatabase(database.migration);
  expect(await structure()).toEqual(before);
  const [rows] = await connection.query<RowDataPacket[]>('SELECT hash FROM __drizzle_migrations');
  expect(rows).toHaveLength(MIGRATIONS.length);
});

test('when a statement that changes rows is killed with its record unwritten, then it counts once', async () => {
  const migration: MigrationMeta = {
    sql: ['CREATE TABLE tides (height int)', 'INSERT INTO tides VALUES (3)'],
    folderMillis: 1,
    hash: 'tides',
    bps: true,
  };
  const whole = dyingAt(Number.POSITIVE_INFINITY, true);
  await applyMigrations(whole.at, [migration]);
  for (let turn = 1; turn <= whole.said(); turn += 1) {
    await dropAll();
    await killedAt(turn, true, [migration]);
    await applyMigrations(connection, [migration]);
    const [rows] = await connection.query<RowDataPacket[]>('SELECT height FROM tides');
    expect(rows).toEqual([{ height: 3 }]);
  }
});

test('when a table stands in the way that no statement under way has made, then it is told at every start', async () => {
  await connection.query('CREATE TABLE accounts (id int)');
  for (let start = 0; start < 2; start += 1)
    await expect(migrateDatabase(database.migration)).rejects.toMatchObject({ errno: 1050 });
});
