import type { DraftDocument } from '#shared/study/draft';
import { same } from '#shared/study/same';
import type { Chord, Voice } from '#shared/study/study.document';

interface Led {
  /** The steps that led to the present, oldest first. */
  readonly past: readonly DraftDocument[];
  readonly present: DraftDocument;
  readonly chordId: string;
}

/** How many of the voices stand on each note of each section. */
function standing(voices: readonly Voice[]): ReadonlyMap<string, number> {
  const counts = new Map<string, number>();
  for (const { section, pitch } of voices) {
    const place = `${section} ${pitch}`;
    counts.set(place, (counts.get(place) ?? 0) + 1);
  }
  return counts;
}

/** Notes were added and the others left as they were: the chord was being written, not altered. */
function isWriting(before: Chord, after: Chord): boolean {
  if (after.voices.length <= before.voices.length) return false;
  const now = standing(after.voices);
  return [...standing(before.voices)].every(([place, count]) => (now.get(place) ?? 0) >= count);
}

const othersOf = (study: DraftDocument, chordId: string): readonly Chord[] =>
  study.chords.filter(({ id }) => id !== chordId);

/** What of a chord is heard: whether its notes are locked is not. */
const heardOf = ({ voices, dynamic }: Chord) => ({
  dynamic,
  voices: voices.map((voice) => ({ ...voice, locked: undefined })),
});

/** Only this chord, or nothing of the chords, was changed by the step from one document to the next. */
function staysWith(chordId: string, before: DraftDocument, after: DraftDocument): boolean {
  const [others, later] = [othersOf(before, chordId), othersOf(after, chordId)];
  return others.length === later.length && others.every((chord, index) => same(chord, later[index]));
}

/**
 * A chord as it was before the latest changes to it: those that followed one another without another chord being
 * changed between them. Writing it, note by note or all at once, is none of them.
 * @param led the history of the document, and which of its chords is meant
 * @returns nothing where its notes have not been changed, or are again as they were
 */
export function chordBefore({ past, present, chordId }: Led): Chord | null {
  const find = (study: DraftDocument) => study.chords.find(({ id }) => id === chordId);
  const now = find(present);
  let [first, after] = [now, present];
  for (const study of past.toReversed()) {
    const before = find(study);
    if (!first || !before || before.voices.length === 0) break;
    if (isWriting(before, first) || !staysWith(chordId, study, after)) break;
    [first, after] = [before, study];
  }
  return now && first && !same(heardOf(first), heardOf(now)) ? first : null;
}
