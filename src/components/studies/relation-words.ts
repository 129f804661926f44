import type { StudyRow } from '#shared/contracts/studies';

/** What the reader may do with a study, in plain words. */
export const RELATION_WORDS: Readonly<Record<StudyRow['relation'], string>> = {
  owner: 'change it',
  comment: 'write remarks',
  view: 'look and listen',
};
