import type { DraftDocument } from '#shared/study/draft';
import { same } from '#shared/study/same';
import type { Chord } from '#shared/study/study.document';

/** A chord in its place of the progression, counted from 1. */
export interface PlacedChord {
  readonly chord: Chord;
  readonly place: number;
}

/** A chord that is not the same in both; `null` where it is not there. */
export interface ChordDifference {
  readonly chordId: string;
  readonly mine: PlacedChord | null;
  readonly theirs: PlacedChord | null;
}

export interface StudyDifferences {
  /** What else is not the same, in the trade's words: `tempo`, `key`. */
  readonly settings: readonly string[];
  /** In the order of the second document; what only the first has follows. */
  readonly chords: readonly ChordDifference[];
  /** Whether the chords that both have stand in another order. */
  readonly reordered: boolean;
}

type Setting = Exclude<keyof DraftDocument, 'schemaVersion' | 'chords'>;

const SETTING_WORDS: Readonly<Record<Setting, string>> = {
  title: 'title',
  about: 'what it is about',
  key: 'key',
  metre: 'metre',
  tempoBpm: 'tempo',
  a4Hz: 'A4',
  intonation: 'intonation',
  ensemble: 'ensemble',
  limits: 'low interval limits',
};
// Object.keys loses the keys' type; the record above has exactly these.
const SETTINGS = Object.keys(SETTING_WORDS) as readonly Setting[];

/**
 * @returns whether two documents say the same
 * @example sameStudy(newStudy('chord-1'), newStudy('chord-1')) // true
 */
export function sameStudy(mine: DraftDocument, theirs: DraftDocument): boolean {
  return same(mine, theirs);
}

function placed(study: DraftDocument): Map<string, PlacedChord> {
  return new Map(study.chords.map((chord, index) => [chord.id, { chord, place: index + 1 }]));
}

/**
 * Lays two states of one study beside each other, chord by chord; chords are known by their ids.
 * @param mine one of them
 * @param theirs the other
 * @returns what is not the same; nothing for equal documents
 */
export function differencesOf(mine: DraftDocument, theirs: DraftDocument): StudyDifferences {
  const [left, right] = [placed(mine), placed(theirs)];
  const ids = [...right.keys(), ...[...left.keys()].filter((id) => !right.has(id))];
  const chords = ids
    .map((chordId) => ({ chordId, mine: left.get(chordId) ?? null, theirs: right.get(chordId) ?? null }))
    .filter((pair) => !same(pair.mine?.chord ?? null, pair.theirs?.chord ?? null));
  const shared = [...left.keys()].filter((id) => right.has(id));
  const reordered = !same(
    shared,
    [...right.keys()].filter((id) => left.has(id)),
  );
  const settings = SETTINGS.filter((name) => !same(mine[name], theirs[name])).map(
    (name) => SETTING_WORDS[name],
  );
  return { settings, chords, reordered };
}
