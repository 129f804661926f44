/** What tells one stretch of editing from the next. */
export interface SaveMark {
  readonly savedAt: Date;
  readonly savedBy: string;
  /** The machine; null where it is not known. */
  readonly deviceKey: string | null;
  readonly name: string | null;
}

/** A pause of ten minutes ends a stretch: the product's own rule. */
export const STRETCH_PAUSE_MS = 600_000;

function goesOn(later: SaveMark, earlier: SaveMark): boolean {
  return (
    earlier.name === null &&
    later.savedBy === earlier.savedBy &&
    later.deviceKey === earlier.deviceKey &&
    later.savedAt.getTime() - earlier.savedAt.getTime() < STRETCH_PAUSE_MS
  );
}

/**
 * Joins saves to stretches of editing by one person on one machine. A save with a name ends its stretch, so that
 * the name stands by what it was given to.
 * @param saves of one study, the newest first
 * @returns the stretches, the newest first, each with its saves, the newest first
 * @example stretchesOf([at(3), at(2), at(1)]).length // 1, for saves at those minutes
 */
export function stretchesOf<Mark extends SaveMark>(saves: readonly Mark[]): readonly (readonly Mark[])[] {
  const stretches: Mark[][] = [];
  for (const save of saves) {
    const open = stretches.at(-1);
    const later = open?.at(-1);
    if (open && later && goesOn(later, save)) open.push(save);
    else stretches.push([save]);
  }
  return stretches;
}
