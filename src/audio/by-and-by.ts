/** Does small pieces of work one after the other, and lets the page breathe in between. */
export interface ByAndBy {
  /** Does a piece of work later. */
  add(work: () => void): void;
  /** Lets what has not been done fall. */
  forget(): void;
}

/**
 * @param waitMilliseconds how long the first piece waits for the last one to be added
 */
export function createByAndBy(waitMilliseconds: number): ByAndBy {
  let pieces: (() => void)[] = [];
  let timer: ReturnType<typeof setTimeout> | null = null;

  function next(): void {
    pieces.shift()?.();
    timer = pieces.length > 0 ? setTimeout(next) : null;
  }

  return {
    add(work) {
      pieces.push(work);
      if (timer !== null) clearTimeout(timer);
      timer = setTimeout(next, waitMilliseconds);
    },
    forget() {
      pieces = [];
    },
  };
}
