import type { Annotation } from '#shared/contracts/annotations';

/**
 * @returns what was said of one chord, or of the study as a whole where no chord is named, newest last
 */
export function remarksOn(annotations: readonly Annotation[], chordId: string | null): readonly Annotation[] {
  return annotations
    .filter(({ anchor }) => (anchor.kind === 'chord' ? anchor.chordId : null) === chordId)
    .toSorted((a, b) => a.writtenAt.localeCompare(b.writtenAt));
}

/** @returns of each chord that was spoken of, how many remarks it has */
export function remarksByChord(annotations: readonly Annotation[]): ReadonlyMap<string, number> {
  const counts = new Map<string, number>();
  for (const { anchor } of annotations) {
    if (anchor.kind === 'chord') counts.set(anchor.chordId, (counts.get(anchor.chordId) ?? 0) + 1);
  }
  return counts;
}
