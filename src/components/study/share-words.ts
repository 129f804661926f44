import type { Share } from '#shared/contracts/shares';

/** What a right means, in plain words. */
export const SHARE_WORDS: Readonly<Record<Share['may'], string>> = {
  view: 'look and listen',
  comment: 'look, listen and write remarks',
};
