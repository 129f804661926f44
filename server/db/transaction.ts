import type { Db, Transaction } from '#server/db/connection';
import { faultNumber } from '#server/db/faults';

const ER_LOCK_WAIT_TIMEOUT = 1205;
const ER_LOCK_DEADLOCK = 1213;
/** A deadlock's loser is undone at once, so trying again is cheap. */
const MOST_RUNS_AFTER_DEADLOCK = 5;
/** A lock that was waited for in vain is likely held long: one more try, then the caller is told. */
const MOST_RUNS_AFTER_LOCK_WAIT = 2;

function mayRunAgain(error: unknown, runs: number): boolean {
  const number = faultNumber(error);
  if (number === ER_LOCK_DEADLOCK) return runs < MOST_RUNS_AFTER_DEADLOCK;
  return number === ER_LOCK_WAIT_TIMEOUT && runs < MOST_RUNS_AFTER_LOCK_WAIT;
}

/**
 * Runs `work` in one transaction, and whole again after a deadlock or a lock wait: after the latter the database
 * has undone one statement only, so the rest must be rolled back too. `work` must therefore have no effect but
 * through `tx`.
 */
export async function inTransaction<T>(db: Db, work: (tx: Transaction) => Promise<T>): Promise<T> {
  for (let runs = 1; ; runs += 1) {
    try {
      return await db.transaction(work);
    } catch (error) {
      if (!mayRunAgain(error, runs)) throw error;
    }
  }
}
