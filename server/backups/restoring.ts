import { once } from 'node:events';
import { createInterface } from 'node:readline';
import type { DatabaseAccess } from '#server/db/access';
import { runClient, type ClientProgram } from '#server/backups/client-programs';
import { readTables, withConnection, type TableState } from '#server/backups/tables';

/** What was not taken over, and so nothing was. */
export class CannotRestore extends Error {
  override readonly name = 'CannotRestore';
}

/**
 * What a restoration leaves as it is: a mail that was sent since is not sent again, guesses stay counted, and the
 * tables are those of the running program.
 */
const LEFT: ReadonlySet<string> = new Set([
  'limits',
  'outbox',
  'demo_mails',
  '__drizzle_migrations',
  '__migration_steps',
]);
/** What it ends: a session or a link of that time would open what has been closed since. */
const ENDED: ReadonlySet<string> = new Set(['sessions', 'tokens']);

const ROWS_ONLY = [
  ...['--no-create-info', '--skip-triggers', '--skip-add-locks', '--skip-disable-keys', '--no-tablespaces'],
  ...['--single-transaction', '--quick', '--hex-blob'],
];
const LAST_LINE = 'siltline-end';

const names = (states: readonly TableState[]): string => states.map(({ table }) => table).join(', ');

function checkTables(live: readonly TableState[], kept: readonly TableState[]): void {
  if (names(live) === names(kept)) return;
  throw new CannotRestore(
    'The tables are not those of this version: start the program once, then try again.',
  );
}

/** The rows that the restored tables have, as the transaction sees them before it ends. */
async function readWithin({ child }: ClientProgram, tables: readonly string[]): Promise<Map<string, string>> {
  const lines = createInterface({ input: child.stdout });
  const asked = tables.map((table) => `CHECKSUM TABLE \`${table}\`;\n`).join('');
  child.stdin.write(`\n${asked}SELECT '${LAST_LINE}';\n`);
  const found = new Map<string, string>();
  for await (const line of lines) {
    if (line === LAST_LINE) return found;
    const [table = '', checksum = ''] = line.split('\t');
    found.set(table.split('.').at(-1) ?? '', checksum);
  }
  throw new CannotRestore('The database ended the restoration; nothing was changed.');
}

async function copyRows(from: DatabaseAccess, into: ClientProgram, tables: readonly string[]): Promise<void> {
  const rows = await runClient('mariadb-dump', from, ROWS_ONLY, tables);
  rows.child.stdout.pipe(into.child.stdin, { end: false });
  await rows.ended;
  if (!rows.child.stdout.readableEnded) await once(rows.child.stdout, 'end');
}

function differing(kept: readonly TableState[], found: ReadonlyMap<string, string>): string[] {
  return kept.filter(({ table, checksum }) => found.get(table) !== checksum).map(({ table }) => table);
}

/**
 * Puts the rows of one database in place of another's, in one transaction: the running program sees the old ones or
 * the new ones. They are compared before it ends.
 * @returns what was restored
 * @throws {CannotRestore} if anything differs; then nothing was changed
 */
export async function replaceRows(
  from: DatabaseAccess,
  into: DatabaseAccess,
): Promise<readonly TableState[]> {
  const kept = await withConnection(from, readTables);
  checkTables(await withConnection(into, readTables), kept);
  const restored = kept.filter(({ table }) => !LEFT.has(table) && !ENDED.has(table));
  const tables = restored.map(({ table }) => table);
  const client = await runClient('mariadb', into, ['--batch', '--skip-column-names', '--unbuffered']);
  const emptied = [...tables, ...ENDED].map((table) => `DELETE FROM \`${table}\`;\n`).join('');
  client.child.stdin.write(`SET foreign_key_checks = 0;\nSTART TRANSACTION;\n${emptied}`);
  await copyRows(from, client, tables);
  const different = differing(restored, await readWithin(client, tables));
  client.child.stdin.end(different.length === 0 ? 'COMMIT;\n' : 'ROLLBACK;\n');
  await client.ended;
  if (different.length > 0)
    throw new CannotRestore(
      `These tables did not come out as they were: ${different.join(', ')}. Nothing was changed.`,
    );
  return restored;
}
