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
import { insertOnce } from '#server/db/insert-once';
import type { Deps } from '#server/deps';
import type { Viewer } from '#server/http/bind';
import { invalidInput, notAllowed, RequestError } from '#server/http/request-error';
import { checkSameRequest } from '#server/studies/saving.service';
import { accessStudy } from '#server/studies/studies.access';
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
  { db }: Pick<Deps, 'db'>,
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
  deps: Pick<Deps, 'db' | 'clock'>,
  viewer: Viewer,
  studyId: string,
  body: BodyOf<typeof createAnnotation>,
): Promise<Annotation> {
  const { db, clock } = deps;
  await accessStudy(db, viewer, studyId, 'annotate');
  const { anchor, text, requestKey } = body;
  const key = { studyId, authorId: viewer.id, requestKey };
  const earlier = await findAnnotationByKey(db, key);
  if (earlier === null) {
    const chordId = await anchoredChord(deps, viewer, studyId, anchor);
    await insertOnce(() =>
      insertAnnotation(db, { ...key, id: randomSecret(), chordId, text, writtenAt: clock() }),
    );
  }
  const row = earlier ?? (await findAnnotationByKey(db, key));
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
  const { relation } = await accessStudy(db, viewer, studyId, 'read');
  const annotation = await findAnnotation(db, studyId, annotationId);
  if (annotation === null) throw unknownAnnotation();
  if (annotation.authorId !== viewer.id && !mayDoToStudy(relation, 'moderate')) throw notAllowed();
  await removeAnnotation(db, annotationId);
}
