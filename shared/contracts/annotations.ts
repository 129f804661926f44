import { z } from 'zod';
import { defineEndpoint } from '#shared/contracts/endpoint';
import { idSchema } from '#shared/contracts/ids';
import { studyParams } from '#shared/contracts/studies';

/** What an annotation hangs on. */
export const anchorSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('study') }),
  z.strictObject({ kind: z.literal('chord'), chordId: z.string().max(36) }),
]);
export type Anchor = z.infer<typeof anchorSchema>;

export const MAX_ANNOTATION = 4000;

export const annotationSchema = z.object({
  id: z.string(),
  anchor: anchorSchema,
  text: z.string(),
  authorName: z.string(),
  /** Whether the reader wrote it. */
  mine: z.boolean(),
  writtenAt: z.iso.datetime(),
});
export type Annotation = z.infer<typeof annotationSchema>;

export const listAnnotations = defineEndpoint({
  method: 'GET',
  path: '/api/studies/:studyId/annotations',
  params: studyParams,
  response: z.object({ annotations: z.array(annotationSchema) }),
});

export const createAnnotation = defineEndpoint({
  method: 'POST',
  path: '/api/studies/:studyId/annotations',
  params: studyParams,
  body: z.strictObject({
    anchor: anchorSchema,
    text: z.string().trim().min(1, 'write something first').max(MAX_ANNOTATION),
    requestKey: z.uuid(),
  }),
  response: annotationSchema,
});

/** By its author, or by the owner of the study. */
export const deleteAnnotation = defineEndpoint({
  method: 'DELETE',
  path: '/api/studies/:studyId/annotations/:annotationId',
  params: studyParams.extend({ annotationId: idSchema }),
  response: z.object({}),
});
