import { Worker } from 'node:worker_threads';
import { RequestError } from '#server/http/request-error';
import { isBuilt } from '#server/setup/product';

interface Waiting<Job> {
  readonly job: Job;
  readonly resolve: (result: unknown) => void;
  readonly reject: (error: unknown) => void;
}

export interface WorkerPool<Job> {
  run(job: Job): Promise<unknown>;
  close(): Promise<void>;
}

export interface WorkerPoolSettings {
  /** The thread's module among the sources, from this folder: `../accounts/password.worker`. */
  readonly module: string;
  readonly count: number;
  /** With so many waiting, the next is refused. */
  readonly mostWaiting: number;
  /** What is told then. */
  readonly busy: string;
}

const RETRY_AFTER_S = 5;

/** From the sources a thread knows nothing of TypeScript until it is told. */
function startFromSource(source: URL): Worker {
  const start = `import('tsx/esm/api').then(({ tsImport }) => tsImport('${source.href}', '${import.meta.url}'))`;
  return new Worker(start, { eval: true, execArgv: [] });
}

/** Built, all threads' modules lie beside the server, named as their sources are. */
function startWorker(module: string): Worker {
  const built = `./${module.slice(module.lastIndexOf('/') + 1)}.js`;
  const worker = isBuilt
    ? new Worker(new URL(built, import.meta.url))
    : startFromSource(new URL(`${module}.ts`, import.meta.url));
  worker.unref();
  return worker;
}

/** Runs one job. @returns whether the worker lives on: one that died is replaced at the next job. */
function runIn<Job>(worker: Worker, { job, resolve, reject }: Waiting<Job>): Promise<boolean> {
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
    worker.once('exit', () => settle(false, () => reject(new Error('The worker thread has ended.'))));
    worker.postMessage(job);
  });
}

/** Threads for what takes long: done in the event loop, every other request would wait. */
export function createWorkerPool<Job>(settings: WorkerPoolSettings): WorkerPool<Job> {
  const waiting: Waiting<Job>[] = [];
  const idle: Worker[] = [];
  const all = new Set<Worker>();

  const serve = async (): Promise<void> => {
    const worker = idle.pop() ?? (all.size < settings.count ? startWorker(settings.module) : undefined);
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
        if (waiting.length >= settings.mostWaiting) {
          return reject(new RequestError(503, 'server.busy', settings.busy, { retryAfterS: RETRY_AFTER_S }));
        }
        waiting.push({ job, resolve, reject });
        void serve();
      }),
    close: async () => {
      await Promise.all([...all].map((worker) => worker.terminate()));
    },
  };
}
