import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { connectionOptions, type DatabaseAccess } from '#server/db/access';
import { readDocument } from '#server/studies/documents';

/** How many rows a table has, and one number that changes with any of them. */
export interface TableState {
  readonly table: string;
  readonly rows: number;
  readonly checksum: string;
}

export async function withConnection<T>(
  access: DatabaseAccess,
  work: (connection: Connection) => Promise<T>,
): Promise<T> {
  const connection = await createConnection(connectionOptions(access));
  try {
    return await work(connection);
  } finally {
    await connection.end();
  }
}

/** The names are the database's own and hold no quote. */
async function tableNames(connection: Connection): Promise<string[]> {
  const [found] = await connection.query<RowDataPacket[]>(
    "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE' ORDER BY table_name",
  );
  return found.map(({ name }) => String(name));
}

export async function readTables(connection: Connection): Promise<TableState[]> {
  const states: TableState[] = [];
  for (const table of await tableNames(connection)) {
    const [[counted]] = await connection.query<RowDataPacket[]>(
      `SELECT COUNT(*) AS rows_found FROM \`${table}\``,
    );
    const [[checked]] = await connection.query<RowDataPacket[]>(`CHECKSUM TABLE \`${table}\``);
    states.push({ table, rows: Number(counted?.rows_found), checksum: String(checked?.Checksum) });
  }
  return states;
}

/**
 * Reads study after study, so that no more than one study's saves are held at once.
 * @returns how many saves there are
 * @throws {Error} if a kept study cannot be read as one
 */
export async function readEveryStudy(connection: Connection): Promise<number> {
  const [studies] = await connection.query<RowDataPacket[]>('SELECT id FROM studies');
  let read = 0;
  for (const { id } of studies) {
    const [saves] = await connection.query<RowDataPacket[]>('SELECT document FROM saves WHERE study_id = ?', [
      id,
    ]);
    for (const { document } of saves) readDocument(document);
    read += saves.length;
  }
  return read;
}
