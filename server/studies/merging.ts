import { mergeStudies } from '#shared/study/study.merge';
import { newsBetween } from '#shared/study/merged';
import { studyDocumentSchema } from '#shared/study/study.document';
import type { Transaction } from '#server/db/connection';
import { findAcceptedDocument, findSavers, type NewSave } from '#server/studies/saves.repository';

/**
 * Joins a stale save with what was saved since it began.
 * @returns the save to accept in its place; `null` where both touched the same chord or setting, or where the save
 *   that it began from is not kept any more
 */
export async function mergeWithNewest(
  tx: Transaction,
  save: NewSave,
  newestNumber: number,
): Promise<NewSave | null> {
  const { studyId, basedOn, document: mine } = save;
  const [base, newest] = [
    await findAcceptedDocument(tx, studyId, basedOn),
    await findAcceptedDocument(tx, studyId, newestNumber),
  ];
  const merged = base && newest && mergeStudies({ base, newest, mine });
  if (!merged) return null;
  const savers = await findSavers(tx, studyId, basedOn + 1, newestNumber);
  const told = {
    withNumber: newestNumber,
    savedByNames: savers.filter(({ id }) => id !== save.savedBy).map(({ name }) => name),
    ...newsBetween(base, newest),
  };
  return {
    ...save,
    document: studyDocumentSchema.parse(merged),
    merge: { sent: mine, told: { ...told, chords: [...told.chords], settings: [...told.settings] } },
  };
}
