import { z } from 'zod';
import { saveStudy } from '#shared/contracts/studies';
import { draftDocumentSchema } from '#shared/study/study.document';
import { WORK_PREFIX as PREFIX, type TextStorage } from '@/stores/work-storage';

const keptWorkSchema = z.strictObject({
  /** Whose work it is: nobody else finds it, whoever signs in here next. */
  accountId: z.string(),
  /** The number of the save that it began from. */
  basedOn: z.number().int().min(1),
  document: draftDocumentSchema,
  /** What was sent and not answered; it is sent again under its own key before anything newer. */
  pending: saveStudy.body.nullable(),
});
/** What of an open study the server does not have yet. */
export type KeptWork = z.infer<typeof keptWorkSchema>;

function parse(text: string | null): KeptWork | null {
  try {
    const parsed = keptWorkSchema.safeParse(JSON.parse(text ?? 'null'));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** @returns what this person left unsaved of a study in this browser */
export function readWork(storage: TextStorage | null, studyId: string, accountId: string): KeptWork | null {
  const work = parse(storage?.getItem(PREFIX + studyId) ?? null);
  return work?.accountId === accountId ? work : null;
}

/**
 * @returns what is kept of a study of this person's and cannot be read: another edition of the program wrote it, or it
 *   was damaged. As it is, so that it can be taken away
 */
export function readUnreadable(
  storage: TextStorage | null,
  studyId: string,
  accountId: string,
): string | null {
  const text = storage?.getItem(PREFIX + studyId) ?? null;
  return text !== null && parse(text) === null && isOf(text, accountId) ? text : null;
}

/** Whose it is can be told even of what cannot be read. */
function isOf(text: string, accountId: string): boolean {
  return text.includes(JSON.stringify(accountId));
}

/** @returns whether the browser kept it: it does not when its store is full or shut */
export function writeWork(storage: TextStorage | null, studyId: string, work: KeptWork): boolean {
  try {
    storage?.setItem(PREFIX + studyId, JSON.stringify(work));
    return storage !== null;
  } catch {
    return false;
  }
}

export function forgetWork(storage: TextStorage | null, studyId: string): void {
  storage?.removeItem(PREFIX + studyId);
}

function keys(storage: TextStorage | null): string[] {
  const all = Array.from({ length: storage?.length ?? 0 }, (_, index) => storage?.key(index) ?? '');
  return all.filter((key) => key.startsWith(PREFIX));
}

/** @returns the studies of which this browser keeps unsaved work of this person */
export function studiesWithWork(storage: TextStorage | null, accountId: string): string[] {
  return keys(storage)
    .map((key) => key.slice(PREFIX.length))
    .filter((studyId) => readWork(storage, studyId, accountId) !== null);
}

/** @returns what this browser keeps unsaved of this person, by study */
export function allWork(storage: TextStorage | null, accountId: string): ReadonlyMap<string, KeptWork> {
  const works = studiesWithWork(storage, accountId).map(
    (studyId) => [studyId, readWork(storage, studyId, accountId)] as const,
  );
  return new Map(works.flatMap(([studyId, work]) => (work ? [[studyId, work]] : [])));
}

export function forgetAllWork(storage: TextStorage | null): void {
  for (const key of keys(storage)) storage?.removeItem(key);
}

/** Takes away what others left here when somebody signs in. */
export function forgetWorkOfOthers(storage: TextStorage | null, accountId: string): void {
  for (const key of keys(storage)) {
    if (!isOf(storage?.getItem(key) ?? '', accountId)) storage?.removeItem(key);
  }
}
