import { studySchema, type StaleDetails, type Study } from '#shared/contracts/studies';
import { MAX_TITLE } from '#shared/study/study.document';
import { newRequestKey } from '@/api/request-key';
import { forgetWork } from '@/stores/kept-work';
import { layOut, type StudyDesk } from '@/stores/study-desk';
import { copyAsOwn } from '@/stores/study-opening';
import { flush } from '@/stores/study-saving';

/** The newest save without what only the conflict says of it. */
function newestOf(desk: StudyDesk): Study | null {
  const parsed = studySchema.safeParse(desk.conflict.value?.newest);
  return parsed.success ? parsed.data : null;
}

/** Saves what is on the bench on top of the newest; that one stays kept under its number. */
export async function keepMine(desk: StudyDesk): Promise<void> {
  const newest = newestOf(desk);
  if (!newest) return;
  layOut(desk, newest);
  await flush(desk);
}

/** Puts the newest on the bench; one's own stays kept under the number it was set aside with. */
export function takeTheirs(desk: StudyDesk): void {
  const newest = newestOf(desk);
  if (!newest) return;
  layOut(desk, newest);
  desk.bench.replaceDocument(newest.document);
  forgetWork(desk.works, newest.id);
}

/** Makes a new study of what is on the bench and goes on with that; the other stands as it is. */
export async function keepMineAsNew(desk: StudyDesk): Promise<Study | null> {
  const [newest, conflict] = [newestOf(desk), desk.conflict.value];
  if (!newest || !conflict) return null;
  const key = copyKeys.get(conflict) ?? newRequestKey();
  copyKeys.set(conflict, key);
  const created = await copyAsOwn(desk, ownTitle(desk.bench.study.title), key);
  forgetWork(desk.works, newest.id);
  return created;
}

/** Of each conflict the key of the copy it may become, so that asking twice makes one. */
const copyKeys = new WeakMap<StaleDetails, string>();

const OWN = ' (mine)';

/** Cuts between characters: half of one could not be saved. */
export function ownTitle(title: string): string {
  const characters = Array.from(title);
  while ((characters.join('') + OWN).length > MAX_TITLE) characters.pop();
  return characters.join('') + OWN;
}
