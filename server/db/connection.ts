import { drizzle, type MySql2Database } from 'drizzle-orm/mysql2';
import { createPool, type Pool } from 'mysql2/promise';
import { connectionOptions, type DatabaseAccess } from '#server/db/access';

export type Db = MySql2Database;
export type Transaction = Parameters<Parameters<Db['transaction']>[0]>[0];
/** For what may run inside a transaction or on its own. */
export type Connection = Db | Transaction;

const CONNECTIONS = 10;
const CONNECT_TIMEOUT_MS = 3000;
/** Beyond these, requests are told to come back instead of piling up. */
const MOST_WAITING = 200;
/** The server's own default is 50 s: of a held lock one should hear while the person still waits for the page. */
const LOCK_WAIT_S = 4;

const SESSION_SETTINGS = [
  "time_zone = '+00:00'",
  "sql_mode = 'STRICT_ALL_TABLES,NO_ENGINE_SUBSTITUTION,ERROR_FOR_DIVISION_BY_ZERO'",
  `innodb_lock_wait_timeout = ${LOCK_WAIT_S}`,
  "tx_isolation = 'READ-COMMITTED'",
].join(', ');

/** The connections that requests share. A connection that dies is replaced at the next use. */
export function openPool(access: DatabaseAccess): Pool {
  const pool = createPool({
    ...connectionOptions(access),
    connectionLimit: CONNECTIONS,
    connectTimeout: CONNECT_TIMEOUT_MS,
    queueLimit: MOST_WAITING,
    enableKeepAlive: true,
  });
  // Runs first on each connection: the driver sends in the order in which it was told.
  pool.pool.on('connection', (connection) => {
    connection.query(`set session ${SESSION_SETTINGS}`, () => undefined);
  });
  return pool;
}

export function openDb(pool: Pool): Db {
  return drizzle({ client: pool });
}
