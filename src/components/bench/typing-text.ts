import type { TypingFault } from '#shared/study/typing-line.words';

/** A stretch of the typed text, faulty or not. */
export interface Stretch {
  readonly text: string;
  readonly faulty: boolean;
}

/** Cuts the text at its faults, so that their places can be underlined. */
export function stretchesOf(text: string, faults: readonly TypingFault[]): readonly Stretch[] {
  const stretches: Stretch[] = [];
  let at = 0;
  for (const { start, end } of faults) {
    if (start < at) continue;
    stretches.push(
      { text: text.slice(at, start), faulty: false },
      { text: text.slice(start, end), faulty: true },
    );
    at = end;
  }
  return [...stretches, { text: text.slice(at), faulty: false }].filter((stretch) => stretch.text !== '');
}

/** While somebody types, the word at the caret may still become one: it is no fault yet. */
export function settledFaults(
  faults: readonly TypingFault[],
  text: string,
  caret: number,
): readonly TypingFault[] {
  return faults.filter(
    ({ start, end }) => caret < start || caret > end || (caret === end && caret < text.length),
  );
}
