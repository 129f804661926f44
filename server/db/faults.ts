/** What a fault of the database tells; its message is left out, as it may quote bound values. */
export interface DatabaseFault {
  readonly code: string;
  readonly errno: number | null;
}

const AWAY_CODES = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EPIPE',
  'ENOENT',
  'ETIMEDOUT',
  'PROTOCOL_CONNECTION_LOST',
  'PROTOCOL_ENQUEUE_AFTER_FATAL_ERROR',
  'POOL_CLOSED',
  'POOL_NONEONLINE',
]);

/** Too many connections, shutting down, killed, lock wait and deadlock given up, disk or table full, read only. */
const AWAY_NUMBERS = new Set([1040, 1053, 1927, 1205, 1213, 1021, 1114, 1290, 1836]);

function* causes(error: unknown): Generator<object> {
  for (let at: unknown = error; typeof at === 'object' && at !== null;) {
    yield at;
    at = 'cause' in at ? at.cause : null;
  }
}

/** @returns the driver's fault inside what was thrown, or null when the database is not what failed. */
export function databaseFault(error: unknown): DatabaseFault | null {
  for (const cause of causes(error)) {
    const fromDriver = 'sqlState' in cause || 'fatal' in cause || 'errno' in cause;
    if (fromDriver && 'code' in cause && typeof cause.code === 'string') {
      const errno = 'errno' in cause && typeof cause.errno === 'number' ? cause.errno : null;
      return { code: cause.code, errno };
    }
    if (cause instanceof Error && /^(Pool is closed|Queue limit reached)/.test(cause.message)) {
      return { code: 'POOL_CLOSED', errno: null };
    }
  }
  return null;
}

export function faultNumber(error: unknown): number | null {
  return databaseFault(error)?.errno ?? null;
}

const ER_DUP_ENTRY = 1062;

export function isDuplicate(error: unknown): boolean {
  return faultNumber(error) === ER_DUP_ENTRY;
}

/** @returns whether the database is away or cannot take a change now, so that the same request may pass later. */
export function isDatabaseAway(error: unknown): boolean {
  const fault = databaseFault(error);
  if (fault === null) return false;
  return AWAY_CODES.has(fault.code) || (fault.errno !== null && AWAY_NUMBERS.has(fault.errno));
}
