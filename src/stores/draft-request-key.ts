import { newRequestKey } from '@/api/request-key';

const DRAFT_REQUEST_KEY = 'siltline.draft.request-key';

/** The key under which the draft becomes a study: the same until it has, so that a retry makes no second one. */
export function draftRequestKey(storage: Storage | null): string {
  const known = storage?.getItem(DRAFT_REQUEST_KEY) ?? null;
  if (known !== null) return known;
  const key = newRequestKey();
  storage?.setItem(DRAFT_REQUEST_KEY, key);
  return key;
}

export function forgetDraftRequestKey(storage: Storage | null): void {
  storage?.removeItem(DRAFT_REQUEST_KEY);
}
