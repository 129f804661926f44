import type { BodyOf, ParamsOf, QueryOf, ResponseOf } from '#shared/contracts/endpoint';
import type { listVersions, nameVersion, readVersion, Version } from '#shared/contracts/versions';
import { stretchesOf } from '#shared/study/stretches';
import type { SaveKind } from '#server/db/schema/saves';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { RequestError } from '#server/http/request-error';
import { accessStudy, lockStudy } from '#server/studies/studies.access';
import { findMarks, findVersion, setVersionName, type Mark } from '#server/studies/versions.repository';

/** Saves looked at for one page: a stretch that is longer shows as two. */
const MOST_SAVES = 500;

function unknownVersion(): RequestError {
  return new RequestError(404, 'version.unknown', 'This version is not kept any more.');
}

function toVersion(kind: SaveKind, stretch: readonly Mark[]): Version[] {
  const [last, first] = [stretch[0], stretch.at(-1)];
  if (last === undefined || first === undefined) return [];
  return [
    {
      kind,
      number: last.number,
      firstNumber: first.number,
      begunAt: first.savedAt.toISOString(),
      savedAt: last.savedAt.toISOString(),
      basedOn: first.basedOn,
      savedByName: last.savedByName,
      merged: stretch.some(({ merged }) => merged),
      name: last.name,
    },
  ];
}

/** @returns the versions of a study, for those who may change it: earlier thoughts are theirs alone */
export async function versionsPage(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  studyId: string,
  { kind, before, limit }: QueryOf<typeof listVersions>,
): Promise<ResponseOf<typeof listVersions>> {
  await accessStudy(db, viewer, studyId, 'save');
  const marks = await findMarks(db, studyId, kind, before ?? null, MOST_SAVES);
  const found = kind === 'accepted' ? stretchesOf(marks) : marks.map((mark) => [mark]);
  // The last stretch may go on in what was not read: it is left to the next page.
  const mayGoOn = marks.length === MOST_SAVES && found.length > 1;
  const shown = found.slice(0, Math.min(limit, mayGoOn ? found.length - 1 : found.length));
  const versions = shown.flatMap((stretch) => toVersion(kind, stretch));
  const isAll = marks.length < MOST_SAVES && shown.length === found.length;
  return { versions, next: isAll ? null : (versions.at(-1)?.firstNumber ?? null) };
}

export async function findVersionFor(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  { studyId, kind, number }: ParamsOf<typeof readVersion>,
): Promise<ResponseOf<typeof readVersion>> {
  await accessStudy(db, viewer, studyId, 'save');
  const found = await findVersion(db, studyId, kind, Number(number));
  if (found === null) throw unknownVersion();
  return { ...found, kind, savedAt: found.savedAt.toISOString() };
}

export async function renameVersion(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  { studyId, kind, number }: ParamsOf<typeof nameVersion>,
  { name }: BodyOf<typeof nameVersion>,
): Promise<ResponseOf<typeof nameVersion>> {
  await inTransaction(db, async (tx) => {
    await lockStudy(tx, viewer, studyId, 'save');
    if (!(await setVersionName(tx, studyId, kind, Number(number), name))) throw unknownVersion();
  });
  return { name };
}
