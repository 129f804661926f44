/** What a class is shown one after the other: the order is always the same. */
export const REVEAL_PARTS = ['notes', 'sound', 'overtones', 'figures'] as const;
export type RevealPart = (typeof REVEAL_PARTS)[number];

/** How much is shown. */
export interface Reveal {
  /** Step by step; otherwise all is shown at once. */
  readonly stepwise: boolean;
  /** The last part that is shown. */
  readonly upTo: RevealPart;
}

/** @returns how a chord begins: with its notes, or whole */
export function beginReveal(stepwise: boolean): Reveal {
  return { stepwise, upTo: 'notes' };
}

/** @returns whether a part may be seen and heard yet */
export function shows({ stepwise, upTo }: Reveal, part: RevealPart): boolean {
  return !stepwise || REVEAL_PARTS.indexOf(part) <= REVEAL_PARTS.indexOf(upTo);
}

/** @returns the part that comes next; `null` where all is shown */
export function nextPart({ stepwise, upTo }: Reveal): RevealPart | null {
  return stepwise ? (REVEAL_PARTS[REVEAL_PARTS.indexOf(upTo) + 1] ?? null) : null;
}

/**
 * Uncovers one part more, or covers the last one again; at either end nothing changes.
 * @example stepReveal({ stepwise: true, upTo: 'notes' }, 1).upTo // 'sound'
 */
export function stepReveal(reveal: Reveal, by: 1 | -1): Reveal {
  const part = REVEAL_PARTS[REVEAL_PARTS.indexOf(reveal.upTo) + by];
  return reveal.stepwise && part ? { ...reveal, upTo: part } : reveal;
}
