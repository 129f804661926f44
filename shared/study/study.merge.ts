import { mergeOrder } from '#shared/study/chord-order.merge';
import type { DraftDocument } from '#shared/study/draft';
import { same } from '#shared/study/same';
import { MAX_CHORDS, type Chord } from '#shared/study/study.document';

export interface ThreeStudies {
  /** The save that both began from. */
  readonly base: DraftDocument;
  /** The newest save, made elsewhere meanwhile. */
  readonly newest: DraftDocument;
  /** What is to be saved now. */
  readonly mine: DraftDocument;
}

/** Told apart from `undefined`, which is a chord that is not there. */
const BOTH_CHANGED = Symbol('both changed it');

/** What one side changed wins over what the other left as it was. */
function pick<Value>(base: Value, newest: Value, mine: Value): Value | typeof BOTH_CHANGED {
  if (same(base, mine)) return newest;
  if (same(base, newest) || same(newest, mine)) return mine;
  return BOTH_CHANGED;
}

function byId({ chords }: DraftDocument): ReadonlyMap<string, Chord> {
  return new Map(chords.map((chord) => [chord.id, chord]));
}

function idsOf({ chords }: DraftDocument): readonly string[] {
  return chords.map(({ id }) => id);
}

function mergeChords(studies: ThreeStudies): readonly Chord[] | null {
  const { base, newest, mine } = studies;
  const [was, theirs, own] = [byId(base), byId(newest), byId(mine)];
  const kept = new Map<string, Chord>();
  for (const id of new Set([...was.keys(), ...theirs.keys(), ...own.keys()])) {
    const chord = pick(was.get(id), theirs.get(id), own.get(id));
    if (chord === BOTH_CHANGED) return null;
    if (chord !== undefined) kept.set(id, chord);
  }
  if (kept.size === 0 || kept.size > MAX_CHORDS) return null;
  const orders = { base: idsOf(base), newest: idsOf(newest), mine: idsOf(mine) };
  return mergeOrder(orders, new Set(kept.keys()))?.flatMap((id) => kept.get(id) ?? []) ?? null;
}

type Fields = Readonly<Record<string, unknown>>;

/** Field by field, so that one that is new to the document is merged like the others. */
function mergeSettings({ base, newest, mine }: ThreeStudies): Fields | null {
  const [was, theirs, own]: readonly Fields[] = [base, newest, mine];
  const merged: Record<string, unknown> = {};
  for (const name of new Set([...Object.keys(theirs ?? {}), ...Object.keys(own ?? {})])) {
    if (name === 'chords') continue;
    const value = pick(was?.[name], theirs?.[name], own?.[name]);
    if (value === BOTH_CHANGED) return null;
    if (value !== undefined) merged[name] = value;
  }
  return merged;
}

/**
 * Joins two states of a study that come from one, chord by chord and setting by setting: what one side changed,
 * added, took away or moved stands, wherever the other left it as it was.
 * @param studies the save that both began from, the newest save, and mine
 * @returns the joined study; `null` where both changed the same chord or setting differently, moved the chords
 *   to different orders, or where nothing or more than {@link MAX_CHORDS} chords would be left
 * @example mergeStudies({ base, newest: { ...base, tempoBpm: 80 }, mine: { ...base, title: 'Ebb' } }) // both
 */
export function mergeStudies(studies: ThreeStudies): DraftDocument | null {
  const settings = mergeSettings(studies);
  const chords = settings && mergeChords(studies);
  if (!settings || !chords) return null;
  // Every field of a study is in `settings`, but for the chords: each was taken from one of the three.
  return { ...studies.newest, ...settings, chords: [...chords] };
}
