import { z } from 'zod';
import { defineEndpoint } from '#shared/contracts/endpoint';
import { idSchema } from '#shared/contracts/ids';
import { ensembleSchema, studyDocumentSchema } from '#shared/study/study.document';

export const MAX_VOICING_NAME = 80;

const nameSchema = z.string().trim().min(1, 'a voicing needs a name').max(MAX_VOICING_NAME);
const shape = studyDocumentSchema.shape;

/** A chord with what it stood under when it was kept. */
export const shelvedChordSchema = z.strictObject({
  chord: shape.chords.element,
  key: shape.key,
  a4Hz: shape.a4Hz,
  intonation: shape.intonation,
  ensemble: ensembleSchema,
  limits: shape.limits,
});

export const shelfVoicingSchema = z.object({
  id: z.string(),
  name: z.string(),
  voicing: shelvedChordSchema,
  keptAt: z.iso.datetime(),
});
export type ShelfVoicing = z.infer<typeof shelfVoicingSchema>;

const params = z.object({ voicingId: idSchema });

export const listShelf = defineEndpoint({
  method: 'GET',
  path: '/api/shelf',
  query: z.strictObject({
    after: z.string().max(120).optional(),
    limit: z.coerce.number().int().min(1).max(50).default(20),
    search: z.string().trim().max(MAX_VOICING_NAME).optional(),
  }),
  response: z.object({ voicings: z.array(shelfVoicingSchema), next: z.string().nullable() }),
});

export const keepVoicing = defineEndpoint({
  method: 'POST',
  path: '/api/shelf',
  body: z.strictObject({ name: nameSchema, voicing: shelvedChordSchema, requestKey: z.uuid() }),
  response: shelfVoicingSchema,
});

export const renameVoicing = defineEndpoint({
  method: 'PATCH',
  path: '/api/shelf/:voicingId',
  params,
  body: z.strictObject({ name: nameSchema }),
  response: shelfVoicingSchema,
});

export const deleteVoicing = defineEndpoint({
  method: 'DELETE',
  path: '/api/shelf/:voicingId',
  params,
  response: z.object({}),
});
