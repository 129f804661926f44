import type { BodyOf, QueryOf, ResponseOf } from '#shared/contracts/endpoint';
import type { keepVoicing, listShelf, ShelfVoicing } from '#shared/contracts/shelf';
import { randomSecret } from '#server/accounts/secrets';
import { insertOnce } from '#server/db/insert-once';
import { readMoment, writePosition } from '#server/db/positions';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { RequestError } from '#server/http/request-error';
import {
  findVoicing,
  findVoicingByKey,
  findVoicings,
  insertVoicing,
  removeVoicing,
  setName,
} from '#server/shelf/shelf.repository';
import { checkSameRequest } from '#server/studies/saving.service';

type ShelfDeps = Pick<Deps, 'db' | 'clock'>;

function unknownVoicing(): RequestError {
  return new RequestError(404, 'voicing.unknown', 'This voicing is not on your shelf any more.');
}

const SHELF = 'shelf';

export async function shelfPage(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  { after, limit, search }: QueryOf<typeof listShelf>,
): Promise<ResponseOf<typeof listShelf>> {
  const which = { after: readMoment(SHELF, after), search: search ?? '', limit: limit + 1 };
  const found = await findVoicings(db, viewer, which);
  const voicings = found.slice(0, limit);
  const last = voicings.at(-1);
  const isMore = found.length > limit && last !== undefined;
  const next = isMore ? writePosition(SHELF, { value: Date.parse(last.keptAt), id: last.id }) : null;
  return { voicings, next };
}

async function must(found: Promise<ShelfVoicing | null>): Promise<ShelfVoicing> {
  const voicing = await found;
  if (voicing === null) throw unknownVoicing();
  return voicing;
}

/** The same request, sent again, keeps one. */
export async function keep(
  { db, clock }: ShelfDeps,
  viewer: Viewer,
  { name, voicing, requestKey }: BodyOf<typeof keepVoicing>,
): Promise<ShelfVoicing> {
  const row = { id: randomSecret(), ownerId: viewer.id, name, voicing, keptAt: clock(), requestKey };
  const isNew = await insertOnce(() => insertVoicing(db, row));
  const kept = await must(findVoicingByKey(db, viewer, requestKey));
  if (!isNew) checkSameRequest(kept.voicing, voicing);
  return kept;
}

export async function renameOnShelf(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  voicingId: string,
  name: string,
): Promise<ShelfVoicing> {
  await setName(db, viewer, voicingId, name);
  return must(findVoicing(db, viewer, voicingId));
}

export async function takeOff({ db }: Pick<Deps, 'db'>, viewer: Viewer, voicingId: string): Promise<void> {
  if (!(await removeVoicing(db, viewer, voicingId))) throw unknownVoicing();
}
