import type { ChildProcess } from 'node:child_process';
import { setTimeout as pause } from 'node:timers/promises';
import type { DatabaseAccess } from '#server/db/access';
import { stopMariadb, untilAnswering, untilEnded } from '#server/setup/mariadb/process';

/** What the operator should hear of. */
export interface MariadbEvents {
  onLeftoverStopped(): void;
  onDied(how: string): void;
  onRestarted(): void;
}

const FIRST_PAUSE_MS = 200;
const LONGEST_PAUSE_MS = 30_000;
/** A server that lived so long was well: when it dies, it is started again at once. */
const WELL_AFTER_MS = 60_000;

/**
 * Starts the database server, and again whenever it dies, at growing intervals: a full disk that is emptied needs
 * nobody to start anything.
 * @returns what stops it for good.
 * @throws {Error} if it does not start the first time.
 */
export async function supervise(
  start: () => ChildProcess,
  access: DatabaseAccess,
  events: MariadbEvents,
): Promise<() => Promise<void>> {
  const stopping = new AbortController();
  let child = start();
  try {
    await untilAnswering(child, access);
  } catch (error) {
    await stopMariadb(child);
    throw error;
  }
  const keepAlive = async (): Promise<void> => {
    for (let wait = FIRST_PAUSE_MS, since = Date.now(); ; since = Date.now()) {
      await untilEnded(child);
      if (stopping.signal.aborted) return;
      events.onDied(child.signalCode ?? `exit code ${child.exitCode}`);
      wait = Date.now() - since > WELL_AFTER_MS ? FIRST_PAUSE_MS : wait;
      await pause(wait, undefined, { signal: stopping.signal }).catch(() => undefined);
      if (stopping.signal.aborted) return;
      wait = Math.min(wait * 2, LONGEST_PAUSE_MS);
      child = start();
      await untilAnswering(child, access).then(events.onRestarted, () => stopMariadb(child));
    }
  };
  const kept = keepAlive();
  return async () => {
    stopping.abort();
    await stopMariadb(child);
    await kept;
  };
}
