import { when } from '#shared/time/when';

/** How the work on the bench stands, seen by the reader. */
export interface SavedSituation {
  readonly state: 'draft' | 'readOnly' | 'saved' | 'unsaved' | 'saving' | 'offline' | 'failed' | 'conflict';
  readonly savedAt: string | null;
  /** Of the newest save. */
  readonly number: number | null;
  readonly ownerName: string | null;
  readonly keptInBrowser: boolean;
  readonly now: Date;
  readonly timeZone: string;
}

const NOT_KEPT = 'This browser keeps nothing: save before you close the page';

/** @returns the one line that says whether the work is safe, and where */
export function savedText(situation: SavedSituation): string {
  const { state, savedAt, number, ownerName, keptInBrowser, now, timeZone } = situation;
  switch (state) {
    case 'draft':
      return keptInBrowser ? 'Draft, kept in this browser' : NOT_KEPT;
    case 'readOnly':
      return `${ownerName ?? 'Somebody else'}’s study, to look at and hear`;
    case 'saved':
      return savedAt ? `Saved ${when(new Date(savedAt), now, timeZone)}, save ${number ?? 1}` : 'Saved';
    case 'saving':
      return 'Saving';
    case 'unsaved':
      return keptInBrowser ? 'Not saved yet' : NOT_KEPT;
    case 'offline':
      return keptInBrowser ? 'Offline: kept in this browser, saved when the server is back' : NOT_KEPT;
    case 'failed':
      return keptInBrowser ? 'Not saved, kept in this browser' : NOT_KEPT;
    case 'conflict':
      return 'Set aside: two saves have met, choose';
  }
}
