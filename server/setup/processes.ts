import cluster, { type Worker } from 'node:cluster';
import { once } from 'node:events';
import { realpathSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';
import type { Logger } from 'pino';
import { CannotStart } from '#server/setup/data-folder';
import { groundSchema, type Ground } from '#server/setup/ground';

/** A process that stops in order takes about ten seconds at most; after that it is ended. */
const PATIENCE_MS = 12_000;
const FIRST_PAUSE_MS = 200;
const LONGEST_PAUSE_MS = 30_000;
/** Sent by a process that has come so far that it can listen. */
const ASK_FOR_GROUND = 'ground';

/** Whether this is one of several server processes, started by another. */
export const isServerProcess = cluster.isWorker;

/** @returns what the process that started this one hands over, when it is asked for it */
export async function receiveGround(): Promise<Ground> {
  const answer = once(process, 'message');
  process.send?.(ASK_FOR_GROUND);
  const [message] = await answer;
  return groundSchema.parse(message);
}

/** Resolves when it takes requests. @throws {CannotStart} if it ends instead; it has said why. */
function untilListening(worker: Worker): Promise<void> {
  return new Promise((resolve, reject) => {
    worker.once('listening', () => resolve());
    worker.once('exit', () => reject(new CannotStart('A server process ended as it started.')));
  });
}

function startOne(ground: Ground): Worker {
  const worker = cluster.fork();
  worker.once('message', (message) => message === ASK_FOR_GROUND && worker.send(ground));
  return worker;
}

async function stopOne(worker: Worker): Promise<void> {
  if (worker.isDead()) return;
  const ended = once(worker, 'exit');
  worker.process.kill('SIGTERM');
  const timer = setTimeout(() => worker.process.kill('SIGKILL'), PATIENCE_MS);
  await ended;
  clearTimeout(timer);
}

/**
 * Starts so many server processes on one address, and again whichever dies.
 * @returns what stops them
 * @throws {CannotStart} if one does not start the first time
 */
export async function startProcesses(
  count: number,
  ground: Ground,
  log: Logger,
): Promise<() => Promise<void>> {
  // Of a newer build that is made meanwhile this start wants nothing.
  cluster.setupPrimary({ exec: realpathSync(process.argv[1] ?? '') });
  const stopping = new AbortController();
  const workers = new Set<Worker>();
  let wait = FIRST_PAUSE_MS;

  function keep(worker: Worker): void {
    workers.add(worker);
    worker.once('exit', (code, signal) => {
      workers.delete(worker);
      if (stopping.signal.aborted) return;
      log.error({ how: signal ?? `exit code ${code}` }, 'a server process died; another is being started');
      void replace();
    });
  }

  async function replace(): Promise<void> {
    await pause(wait, undefined, { signal: stopping.signal }).catch(() => undefined);
    if (stopping.signal.aborted) return;
    wait = Math.min(wait * 2, LONGEST_PAUSE_MS);
    const worker = startOne(ground);
    keep(worker);
    await untilListening(worker).then(
      () => (wait = FIRST_PAUSE_MS),
      () => undefined,
    );
  }

  const stop = async (): Promise<void> => {
    stopping.abort();
    await Promise.all([...workers].map(stopOne));
  };
  const first = Array.from({ length: count }, () => startOne(ground));
  try {
    await Promise.all(first.map(untilListening));
    first.forEach(keep);
    return stop;
  } catch (error) {
    await Promise.all(first.map(stopOne));
    throw error;
  }
}
