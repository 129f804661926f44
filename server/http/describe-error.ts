import { databaseFault } from '#server/db/faults';

/** What may stand in a log of a fault. */
export interface ErrorDescription {
  readonly type: string;
  readonly message: string;
  readonly code?: string;
  readonly errno?: number | null;
  readonly stack: readonly string[];
}

/** The lines of a stack that name places in the program: the first ones repeat the message. */
function places(error: Error): string[] {
  return (error.stack ?? '')
    .split('\n')
    .filter((line) => /^\s+at /.test(line))
    .map((line) => line.trim());
}

/**
 * A fault of the database is told by its code alone: the messages of Drizzle and of the driver list bound values,
 * among them addresses and digests.
 */
export function describeError(error: unknown): ErrorDescription {
  const fault = databaseFault(error);
  const stack = error instanceof Error ? places(error) : [];
  if (fault !== null)
    return { type: 'DatabaseFault', message: 'the database refused or is away', ...fault, stack };
  if (!(error instanceof Error))
    return { type: typeof error, message: 'something that is no error was thrown', stack };
  // Drizzle wraps whatever failed in a message that quotes the statement and its values.
  const message =
    error.name === 'DrizzleQueryError' || 'params' in error ? 'a statement failed' : error.message;
  return { type: error.name, message, stack };
}
