import { Worker } from 'node:worker_threads';
import type { PasswordJob } from '#server/accounts/password.worker';
import { RequestError } from '#server/http/request-error';
import { isBuilt } from '#server/setup/product';

/** At a third of a second each, the last of these waits about as long as a person does. */
const MOST_WAITING = 60;
const RETRY_AFTER_S = 5;

interface Waiting {
  readonly job: PasswordJob;
  readonly resolve: (result: unknown) => void;
  readonly reject: (error: unknown) => void;
}

export interface PasswordWorkers {
  run(job: PasswordJob): Promise<unknown>;
  close(): Promise<void>;
}

/** From the sources a thread knows nothing of TypeScript until it is told. */
function startFromSource(source: URL): Worker {
  const start = `import('tsx/esm/api').then(({ tsImport }) => tsImport('${source.href}', '${import.meta.url}'))`;
  return new Worker(start, { eval: true, execArgv: [] });
}

function startWorker(): Worker {
  const worker = isBuilt
    ? new Worker(new URL('./password.worker.js', import.meta.url))
    : startFromSource(new URL('./password.worker.ts', import.meta.url));
  worker.unref();
  return worker;
}

/** Runs one job. @returns whether the worker lives on: one that died is replaced at the next job. */
function runIn(worker: Worker, { job, resolve, reject }: Waiting): Promise<boolean> {
  return new Promise((done) => {
    const settle = (alive: boolean, tell: () => void) => {
      // By name: with no name Node's own listeners, which ports rely on, would go too.
      for (const event of ['message', 'error', 'exit']) worker.removeAllListeners(event);
      worker.unref();
      tell();
      done(alive);
    };
    worker.ref();
    worker.once('message', (result: unknown) => settle(true, () => resolve(result)));
    worker.once('error', (error) => settle(false, () => reject(error)));
    worker.once('exit', () => settle(false, () => reject(new Error('The password worker has ended.'))));
    worker.postMessage(job);
  });
}

/** Hashing takes a third of a second: done in the event loop, every other request would wait. */
export function createPasswordWorkers(count: number): PasswordWorkers {
  const waiting: Waiting[] = [];
  const idle: Worker[] = [];
  const all = new Set<Worker>();

  const serve = async (): Promise<void> => {
    const worker = idle.pop() ?? (all.size < count ? startWorker() : undefined);
    if (worker === undefined) return;
    all.add(worker);
    for (let next = waiting.shift(); next !== undefined; next = waiting.shift()) {
      if (await runIn(worker, next)) continue;
      all.delete(worker);
      return serve();
    }
    idle.push(worker);
  };

  return {
    run: (job) =>
      new Promise((resolve, reject) => {
        if (waiting.length >= MOST_WAITING) {
          const told = 'Too many people are signing in at this moment. Please try again in a few seconds.';
          return reject(new RequestError(503, 'server.busy', told, { retryAfterS: RETRY_AFTER_S }));
        }
        waiting.push({ job, resolve, reject });
        void serve();
      }),
    close: async () => {
      await Promise.all([...all].map((worker) => worker.terminate()));
    },
  };
}
