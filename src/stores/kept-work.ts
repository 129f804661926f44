import { z } from 'zod';
import { saveStudy } from '#shared/contracts/studies';
import { draftDocumentSchema } from '#shared/study/study.document';

const PREFIX = 'siltline.unsaved.';

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
export function readWork(storage: Storage | null, studyId: string, accountId: string): KeptWork | null {
  const work = parse(storage?.getItem(PREFIX + studyId) ?? null);
  return work?.accountId === accountId ? work : null;
}

/** @returns whether the browser kept it: it does not when its store is full or shut */
export function writeWork(storage: Storage | null, studyId: string, work: KeptWork): boolean {
  try {
    storage?.setItem(PREFIX + studyId, JSON.stringify(work));
    return storage !== null;
  } catch {
    return false;
  }
}

export function forgetWork(storage: Storage | null, studyId: string): void {
  storage?.removeItem(PREFIX + studyId);
}

function keys(storage: Storage | null): string[] {
  const all = Array.from({ length: storage?.length ?? 0 }, (_, index) => storage?.key(index) ?? '');
  return all.filter((key) => key.startsWith(PREFIX));
}

/** @returns the studies of which this browser keeps unsaved work of this person */
export function studiesWithWork(storage: Storage | null, accountId: string): string[] {
  return keys(storage)
    .map((key) => key.slice(PREFIX.length))
    .filter((studyId) => readWork(storage, studyId, accountId) !== null);
}

/** @returns what this browser keeps unsaved of this person, by study */
export function allWork(storage: Storage | null, accountId: string): ReadonlyMap<string, KeptWork> {
  const works = studiesWithWork(storage, accountId).map(
    (studyId) => [studyId, readWork(storage, studyId, accountId)] as const,
  );
  return new Map(works.flatMap(([studyId, work]) => (work ? [[studyId, work]] : [])));
}

export function forgetAllWork(storage: Storage | null): void {
  for (const key of keys(storage)) storage?.removeItem(key);
}

/** Takes away what others left here when somebody signs in. */
export function forgetWorkOfOthers(storage: Storage | null, accountId: string): void {
  const own = new Set(studiesWithWork(storage, accountId).map((studyId) => PREFIX + studyId));
  for (const key of keys(storage)) if (!own.has(key)) storage?.removeItem(key);
}
