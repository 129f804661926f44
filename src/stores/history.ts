/** What was before the present and what was undone; snapshots are immutable, so that keeping all is cheap. */
export interface History<Snapshot> {
  readonly past: readonly Snapshot[];
  readonly future: readonly Snapshot[];
}

interface Step<Snapshot> {
  readonly history: History<Snapshot>;
  readonly present: Snapshot;
}

export function emptyHistory<Snapshot>(): History<Snapshot> {
  return { past: [], future: [] };
}

/** @returns the history after a change made from `before`; what was undone is gone */
export function remember<Snapshot>(history: History<Snapshot>, before: Snapshot): History<Snapshot> {
  return { past: [...history.past, before], future: [] };
}

/** @returns one step back, or `null` at the beginning */
export function stepBack<Snapshot>(history: History<Snapshot>, present: Snapshot): Step<Snapshot> | null {
  const before = history.past.at(-1);
  if (before === undefined) return null;
  return {
    history: { past: history.past.slice(0, -1), future: [present, ...history.future] },
    present: before,
  };
}

/** @returns one step forward again, or `null` where nothing was undone */
export function stepForward<Snapshot>(history: History<Snapshot>, present: Snapshot): Step<Snapshot> | null {
  const [after, ...future] = history.future;
  if (after === undefined) return null;
  return { history: { past: [...history.past, present], future }, present: after };
}
