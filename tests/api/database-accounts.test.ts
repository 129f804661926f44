import type { RowDataPacket } from 'mysql2/promise';
import { afterAll, expect, inject, test } from 'vitest';
import { openPool } from '#server/db/connection';
import { pool } from '../support/database';

// MariaDB's own numbers: ER_ACCESS_DENIED_ERROR, ER_TABLEACCESS_DENIED_ERROR, ER_SPECIFIC_ACCESS_DENIED_ERROR.
const NO_SUCH_ACCOUNT = { errno: 1045 };
const NOT_ON_THIS_TABLE = { errno: 1142 };
const RIGHT_MISSING = { errno: 1227 };

const migration = openPool(inject('database').migration);
afterAll(() => migration.end());

async function grantsOf(asked: typeof pool): Promise<string[]> {
  const [rows] = await asked.query<RowDataPacket[]>('SHOW GRANTS');
  return rows.flatMap((row) => Object.values(row).map(String));
}

test('when the account that serves requests is looked at, then it may handle rows and nothing else', async () => {
  const grants = await grantsOf(pool);
  expect(grants).toHaveLength(2);
  expect(grants[0]).toMatch(/^GRANT USAGE ON \*\.\* TO/);
  expect(grants[1]).toMatch(/^GRANT SELECT, INSERT, UPDATE, DELETE ON `siltline`\.\* TO/);
});

test('when that account tries to change a table or to read a file, then it is refused', async () => {
  await expect(pool.query('CREATE TABLE more (id INT)')).rejects.toMatchObject(NOT_ON_THIS_TABLE);
  await expect(pool.query('DROP TABLE accounts')).rejects.toMatchObject(NOT_ON_THIS_TABLE);
  await expect(pool.query("SELECT 1 INTO OUTFILE 'rows'")).rejects.toMatchObject(RIGHT_MISSING);
});

test('when the migrating account is looked at, then its rights end at its own database', async () => {
  const grants = await grantsOf(migration);
  expect(grants[0]).toMatch(/^GRANT USAGE ON \*\.\* TO/);
  expect(grants.slice(1)).toEqual([expect.stringMatching(/^GRANT ALL PRIVILEGES ON `siltline`\.\* TO/)]);
});

test('when somebody comes as root, with or without a password, then there is no such account', async () => {
  for (const password of ['', 'root']) {
    const root = openPool({ ...inject('database').app, user: 'root', password });
    await expect(root.query('SELECT 1')).rejects.toMatchObject(NO_SUCH_ACCOUNT);
    await root.end();
  }
});
