import { draftDocumentSchema } from '#shared/study/study.document';
import type { DraftDocument } from '#shared/study/draft';

/** Versioned with the form of what is kept, not with the document's own version. */
export const DRAFT_KEY = 'siltline.draft.1';
export const SET_ASIDE_KEY = 'siltline.draft.set-aside';

/** What the browser has kept of the draft. */
export type KeptDraft =
  | { readonly kind: 'none' }
  | { readonly kind: 'draft'; readonly document: DraftDocument }
  | { readonly kind: 'unreadable'; readonly text: string };

function readJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

/** @returns the browser's store, or `null` where the browser refuses it */
export function browserStorage(): Storage | null {
  try {
    return globalThis.localStorage;
  } catch {
    return null;
  }
}

/** Reads the draft; one that cannot be read is kept aside and never thrown away. */
export function readDraft(storage: Storage | null): KeptDraft {
  const text = storage?.getItem(DRAFT_KEY) ?? null;
  if (text === null) return { kind: 'none' };
  const parsed = draftDocumentSchema.safeParse(readJson(text));
  if (parsed.success) return { kind: 'draft', document: parsed.data };
  storage?.setItem(SET_ASIDE_KEY, text);
  storage?.removeItem(DRAFT_KEY);
  return { kind: 'unreadable', text };
}

/** @returns an unreadable draft that an earlier visit has kept aside */
export function readSetAside(storage: Storage | null): string | null {
  return storage?.getItem(SET_ASIDE_KEY) ?? null;
}

/** Keeps something that cannot be read for the reader to take away; a full browser keeps it as long as the page lasts. */
export function writeSetAside(storage: Storage | null, text: string): void {
  try {
    storage?.setItem(SET_ASIDE_KEY, text);
  } catch {
    // It is on the page all the same.
  }
}

export function forgetSetAside(storage: Storage | null): void {
  storage?.removeItem(SET_ASIDE_KEY);
}

/** @returns whether the browser kept it: it does not when its store is full or shut */
export function writeDraft(storage: Storage | null, document: DraftDocument): boolean {
  try {
    storage?.setItem(DRAFT_KEY, JSON.stringify(document));
    return storage !== null;
  } catch {
    return false;
  }
}
