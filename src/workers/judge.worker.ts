import { JUDGE, type JudgementKind, type Judgements } from '@/workers/judgement';

/** A question as it reaches the worker; the answer goes back under the same number. */
export type NumberedQuestion = {
  [K in JudgementKind]: {
    readonly number: number;
    readonly kind: K;
    readonly question: Judgements[K]['question'];
  };
}[JudgementKind];

export type NumberedAnswer =
  | { readonly number: number; readonly answer: Judgements[JudgementKind]['answer'] }
  | { readonly number: number; readonly fault: string };

function answerTo(asked: NumberedQuestion): Judgements[JudgementKind]['answer'] {
  switch (asked.kind) {
    case 'moves':
      return JUDGE.moves(asked.question);
    case 'limits':
      return JUDGE.limits(asked.question);
    case 'siltline':
      return JUDGE.siltline(asked.question);
  }
}

self.addEventListener('message', ({ data }: MessageEvent<NumberedQuestion>) => {
  const { number } = data;
  try {
    self.postMessage({ number, answer: answerTo(data) } satisfies NumberedAnswer);
  } catch (error) {
    self.postMessage({ number, fault: String(error) } satisfies NumberedAnswer);
  }
});
