import type { DraftDocument } from '#shared/study/draft';
import { differencesOf, type ChordDifference } from '#shared/study/study.differences';

/** What became of a chord between two saves. */
export interface ChordNews {
  readonly change: 'changed' | 'added' | 'removed';
  /** Where it stands, counted from 1: of one that was taken away, where it stood. */
  readonly place: number;
  readonly name: string | null;
}

/** What one save has that an earlier one had not. */
export interface StudyNews {
  readonly chords: readonly ChordNews[];
  /** In the trade's words: `tempo`, `key`. */
  readonly settings: readonly string[];
  readonly reordered: boolean;
}

function newsOf({ mine: before, theirs: after }: ChordDifference): ChordNews[] {
  const placed = after ?? before;
  if (!placed) return [];
  const change = before === null ? 'added' : after === null ? 'removed' : 'changed';
  return [{ change, place: placed.place, name: placed.chord.name }];
}

/**
 * @param before the earlier save
 * @param after the later one
 * @returns what happened between them
 */
export function newsBetween(before: DraftDocument, after: DraftDocument): StudyNews {
  const { chords, settings, reordered } = differencesOf(before, after);
  return { chords: chords.flatMap(newsOf), settings, reordered };
}

const MOST_TOLD = 4;

function chordText({ change, place, name }: ChordNews): string {
  return `chord ${place}${name === null ? '' : `, “${name}”,`} ${change}`;
}

/** `a`, `a and b`, `a, b and c` */
function listed(things: readonly string[]): string {
  const last = things.at(-1) ?? '';
  return things.length < 2 ? last : `${things.slice(0, -1).join(', ')} and ${last}`;
}

/**
 * @param news what the others' saves brought
 * @returns it in a few words; empty where there is nothing to tell
 * @example newsText({ chords: [{ change: 'added', place: 2, name: null }], settings: ['tempo'], reordered: false }) // 'chord 2 added and tempo changed'
 */
export function newsText({ chords, settings, reordered }: StudyNews): string {
  const told = chords.slice(0, MOST_TOLD).map(chordText);
  const rest = chords.length - told.length;
  return listed([
    ...told,
    ...(rest > 0 ? [`${rest} more ${rest === 1 ? 'chord' : 'chords'} changed`] : []),
    ...(reordered ? ['chords moved'] : []),
    ...(settings.length > 0 ? [`${listed(settings)} changed`] : []),
  ]);
}

export interface MergedSave extends StudyNews {
  /** The number of the save that this one was merged with. */
  readonly withNumber: number;
  /** Who else had saved meanwhile; empty where it was the same person, elsewhere. */
  readonly savedByNames: readonly string[];
}

/**
 * @returns what to tell somebody whose save was merged with others'
 * @example mergedText({ withNumber: 5, savedByNames: ['Ada'], chords: [], settings: ['tempo'], reordered: false }) // 'Ada had saved this study meanwhile. Both are kept in one: tempo changed.'
 */
export function mergedText(merged: MergedSave): string {
  const { savedByNames } = merged;
  const who = savedByNames.length > 0 ? listed(savedByNames) : 'You';
  const where = savedByNames.length > 0 ? '' : ' in another window or on another machine';
  const what = newsText(merged);
  return `${who} had saved this study meanwhile${where}. Both are kept in one${what ? `: ${what}` : ''}.`;
}
