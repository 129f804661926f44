import type { JudgementKind, Judgements } from '@/workers/judgement';
import type { NumberedAnswer } from '@/workers/judge.worker';

/** Answers questions that take longer than a frame. */
export interface Judge {
  ask<K extends JudgementKind>(
    kind: K,
    question: Judgements[K]['question'],
  ): Promise<Judgements[K]['answer']>;
}

interface Waiting {
  readonly resolve: (answer: never) => void;
  readonly reject: (fault: Error) => void;
}

/**
 * A judge that works beside the page, so that a drag is never held up.
 * @param start makes the worker, with the first question
 */
export function judgeIn(start: () => Worker): Judge {
  const waiting = new Map<number, Waiting>();
  let worker: Worker | null = null;
  let last = 0;

  function receive({ data }: MessageEvent<NumberedAnswer>): void {
    const asked = waiting.get(data.number);
    waiting.delete(data.number);
    if ('fault' in data) asked?.reject(new Error(data.fault));
    // The worker answers under the number of the question, and so in the kind that was asked for.
    else asked?.resolve(data.answer as never);
  }

  function fail(): void {
    for (const { reject } of waiting.values()) reject(new Error('The worker has stopped.'));
    waiting.clear();
    worker?.terminate();
    worker = null;
  }

  function started(): Worker {
    const made = start();
    made.addEventListener('message', receive);
    made.addEventListener('error', fail);
    return made;
  }

  return {
    ask(kind, question) {
      return new Promise((resolve, reject) => {
        last += 1;
        waiting.set(last, { resolve, reject });
        worker ??= started();
        worker.postMessage({ number: last, kind, question });
      });
    },
  };
}

/** One for the page, so that what it has worked out once serves all. */
export const pageJudge = judgeIn(
  () => new Worker(new URL('../workers/judge.worker.ts', import.meta.url), { type: 'module' }),
);
