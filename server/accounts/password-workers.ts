import type { PasswordJob } from '#server/accounts/password.worker';
import { createWorkerPool, type WorkerPool } from '#server/workers/worker-pool';

/** At a third of a second each, the last of these waits about as long as a person does. */
const MOST_WAITING = 60;

export type PasswordWorkers = WorkerPool<PasswordJob>;

/** Hashing takes a third of a second: done in the event loop, every other request would wait. */
export function createPasswordWorkers(count: number): PasswordWorkers {
  return createWorkerPool({
    module: '../accounts/password.worker',
    count,
    mostWaiting: MOST_WAITING,
    busy: 'Too many people are signing in at this moment. Please try again in a few seconds.',
  });
}
