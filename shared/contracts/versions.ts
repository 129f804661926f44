import { z } from 'zod';
import { defineEndpoint } from '#shared/contracts/endpoint';
import { studyParams } from '#shared/contracts/studies';
import { studyDocumentSchema } from '#shared/study/study.document';

export const VERSION_KINDS = ['accepted', 'set-aside'] as const;
export const MAX_VERSION_NAME = 80;

const timeSchema = z.iso.datetime();
const versionParams = studyParams.extend({
  kind: z.enum(VERSION_KINDS),
  number: z.string().regex(/^[1-9]\d{0,8}$/),
});

/** A stretch of editing by one person on one machine, known by its last save. */
export const versionSchema = z.object({
  kind: z.enum(VERSION_KINDS),
  number: z.number().int(),
  /** Of the stretch's first save. */
  firstNumber: z.number().int(),
  begunAt: timeSchema,
  savedAt: timeSchema,
  /** The accepted save that the stretch began from. */
  basedOn: z.number().int(),
  savedByName: z.string(),
  /** Whether what others had saved was merged into it. */
  merged: z.boolean(),
  name: z.string().nullable(),
});
export type Version = z.infer<typeof versionSchema>;

export const listVersions = defineEndpoint({
  method: 'GET',
  path: '/api/studies/:studyId/versions',
  params: studyParams,
  query: z.strictObject({
    kind: z.enum(VERSION_KINDS).default('accepted'),
    /** From the previous page's `next`. */
    before: z.coerce.number().int().min(1).optional(),
    limit: z.coerce.number().int().min(1).max(50).default(20),
  }),
  response: z.object({ versions: z.array(versionSchema), next: z.number().int().nullable() }),
});

export const readVersion = defineEndpoint({
  method: 'GET',
  path: '/api/studies/:studyId/versions/:kind/:number',
  params: versionParams,
  response: z.object({
    kind: z.enum(VERSION_KINDS),
    number: z.number().int(),
    savedAt: timeSchema,
    savedByName: z.string(),
    name: z.string().nullable(),
    document: studyDocumentSchema,
  }),
});

/** A version with a name is kept for good. */
export const nameVersion = defineEndpoint({
  method: 'PATCH',
  path: '/api/studies/:studyId/versions/:kind/:number',
  params: versionParams,
  body: z.strictObject({
    name: z
      .string()
      .trim()
      .min(1, 'a version’s name has at least one letter')
      .max(MAX_VERSION_NAME)
      .nullable(),
  }),
  response: z.object({ name: z.string().nullable() }),
});
