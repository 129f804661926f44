import { setTimeout as pause } from 'node:timers/promises';

/** What has to be undone at the end, in reverse order. */
export interface Closing {
  /** A step that takes longer than its patience is left to itself. */
  add(step: () => unknown, patienceMs?: number): void;
  /** Undoes everything once, whatever fails on the way. */
  run(onFailure: (error: unknown) => void): Promise<void>;
}

export function createClosing(): Closing {
  const steps: (() => unknown)[] = [];
  return {
    add: (step, patienceMs) =>
      steps.push(patienceMs === undefined ? step : () => within(patienceMs, Promise.resolve(step()))),
    run: async (onFailure) => {
      for (let step = steps.pop(); step; step = steps.pop()) {
        try {
          await step();
        } catch (error) {
          onFailure(error);
        }
      }
    },
  };
}

async function within(patienceMs: number, done: Promise<unknown>): Promise<void> {
  const waiting = new AbortController();
  const tooLate = pause(patienceMs, undefined, { signal: waiting.signal }).then(() => {
    throw new Error(`It took longer than ${patienceMs} ms.`);
  });
  try {
    await Promise.race([done, tooLate]);
  } finally {
    // Nobody waits for it any more: that it ends so is no failure.
    tooLate.catch(() => undefined);
    waiting.abort();
  }
}
