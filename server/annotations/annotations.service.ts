import type { Anchor, Annotation, createAnnotation } from '#shared/contracts/annotations';
import type { BodyOf } from '#shared/contracts/endpoint';
import { mayDoToStudy } from '#shared/contracts/permissions';
import { randomSecret } from '#server/accounts/secrets';
import {
  findAnnotation,
  findAnnotationByKey,
  findAnnotations,
  insertAnnotation,
  removeAnnotation,
  type AnnotationRow,
} from '#server/annotations/annotations.repository';
import type { Connection } from '#server/db/connection';
import { inTransaction } from '#server/db/transaction';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { invalidInput, notAllowed, RequestError } from '#server/http/request-error';
import { checkSameRequest } from '#server/studies/saving.service';
import { accessStudy, lockStudy } from '#server/studies/studies.access';
import { findStudy } from '#server/studies/studies.repository';

export function unknownAnnotation(): RequestError {
  return new RequestError(404, 'annotation.unknown', 'This annotation is not there any more.');
}

function anchorOf(chordId: string | null): Anchor {
  return chordId === null ? { kind: 'study' } : { kind: 'chord', chordId };
}

function toAnnotation(viewer: Viewer, row: AnnotationRow): Annotation {
  const { id, text, authorName, authorId, chordId } = row;
  const mine = authorId === viewer.id;
  return { id, anchor: anchorOf(chordId), text, authorName, mine, writtenAt: row.writtenAt.toISOString() };
}

export async function readAnnotations(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  studyId: string,
): Promise<Annotation[]> {
  await accessStudy(db, viewer, studyId, 'read');
  return (await findAnnotations(db, studyId)).map((row) => toAnnotation(viewer, row));
}

/** @returns the chord that an annotation hangs on, which must stand in the newest save; null for the study. */
async function anchoredChord(
  db: Connection,
  viewer: Viewer,
  studyId: string,
  anchor: Anchor,
): Promise<string | null> {
  if (anchor.kind === 'study') return null;
  const { document } = await findStudy(db, viewer, studyId);
  if (document.chords.some((chord) => chord.id === anchor.chordId)) return anchor.chordId;
  const message = 'this chord is not in the study any more';
  throw invalidInput([{ path: 'body.anchor.chordId', message }]);
}

export async function annotate(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  viewer: Viewer,
  studyId: string,
  body: BodyOf<typeof createAnnotation>,
): Promise<Annotation> {
  const { anchor, text, requestKey } = body;
  const key = { studyId, authorId: viewer.id, requestKey };
  const row = await inTransaction(db, async (tx) => {
    // Nobody takes the right back, or the chord away, between the check and the writing.
    await lockStudy(tx, viewer, studyId, 'annotate');
    const earlier = await findAnnotationByKey(tx, key);
    if (earlier !== null) return earlier;
    const chordId = await anchoredChord(tx, viewer, studyId, anchor);
    await insertAnnotation(tx, { ...key, id: randomSecret(), chordId, text, writtenAt: clock() });
    return findAnnotationByKey(tx, key);
  });
  if (row === null) throw unknownAnnotation();
  checkSameRequest({ anchor: anchorOf(row.chordId), text: row.text }, { anchor, text });
  return toAnnotation(viewer, row);
}

export async function takeAway(
  { db }: Pick<Deps, 'db'>,
  viewer: Viewer,
  studyId: string,
  annotationId: string,
): Promise<void> {
  await inTransaction(db, async (tx) => {
    const { relation } = await lockStudy(tx, viewer, studyId, 'read');
    const annotation = await findAnnotation(tx, studyId, annotationId);
    if (annotation === null) throw unknownAnnotation();
    if (annotation.authorId !== viewer.id && !mayDoToStudy(relation, 'moderate')) throw notAllowed();
    await removeAnnotation(tx, annotationId);
  });
}
