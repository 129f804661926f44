import { z } from 'zod';
import { chordProfileSchema } from '#shared/contracts/chord-profiles';
import { defineEndpoint } from '#shared/contracts/endpoint';
import { idSchema } from '#shared/contracts/ids';
import { RELATIONS } from '#shared/contracts/permissions';
import { MAX_TITLE, MODES, studyDocumentSchema } from '#shared/study/study.document';

export const studyParams = z.object({ studyId: idSchema });
/** Made by the client for each intended change: sent twice, it is done once. */
const requestKeySchema = z.uuid();
export const MAX_TAG = 40;
export const MAX_TAGS = 20;
const nothing = z.object({});
const timeSchema = z.iso.datetime();

/** Names one stretch of editing: a browser's open page. Saves of one page in one stretch show as one version. */
const deviceKeySchema = idSchema.optional();

/** A study as somebody may see it. `number` is the number of its newest save. */
export const studySchema = z.object({
  id: z.string(),
  number: z.number().int(),
  document: studyDocumentSchema,
  relation: z.enum(RELATIONS).exclude(['stranger']),
  ownerName: z.string(),
  savedAt: timeSchema,
});
export type Study = z.infer<typeof studySchema>;

/** A word by which a person finds studies again. */
export const tagSchema = z
  .string()
  .trim()
  .min(1, 'a tag needs at least one letter')
  .max(MAX_TAG, `a tag has at most ${MAX_TAG} characters`);

/** Of a study's chords the first so many stand in its row; the rest is counted. */
export const PROFILES_IN_ROW = 8;

/** A row of the table: what is shown of a study without its document. */
export const studyRowSchema = studySchema.omit({ document: true }).extend({
  title: z.string(),
  about: z.string(),
  key: studyDocumentSchema.shape.key,
  chordCount: z.number().int(),
  /** The index of its cloudiest chord; null until it is worked out. */
  cloudiest: z.number().nullable(),
  chords: z.array(chordProfileSchema).max(PROFILES_IN_ROW),
  /** Whether the figures are of the newest save; they follow within moments. */
  summedUp: z.boolean(),
  /** The viewer's own. */
  tags: z.array(z.string()),
});
export type StudyRow = z.infer<typeof studyRowSchema>;

export const STUDY_SORTS = ['changed', 'title', 'clouded'] as const;
export type StudySort = (typeof STUDY_SORTS)[number];
export const SORT_ORDERS = ['asc', 'desc'] as const;

const pageQuery = {
  /** From the previous page's `next`. */
  after: z.string().max(1000).optional(),
  limit: z.coerce.number().int().min(1).max(50).default(20),
};
const indexSchema = z.coerce.number().min(0).max(100);

export const listStudies = defineEndpoint({
  method: 'GET',
  path: '/api/studies',
  query: z.strictObject({
    ...pageQuery,
    /** Found in the title or in what the study is about. */
    search: z.string().trim().max(MAX_TITLE).optional(),
    tag: tagSchema.optional(),
    whose: z.enum(['own', 'received']).optional(),
    tonic: studyDocumentSchema.shape.key.shape.tonic.optional(),
    mode: z.enum(MODES).optional(),
    /** How clouded its cloudiest chord is, from and up to. */
    from: indexSchema.optional(),
    to: indexSchema.optional(),
    sort: z.enum(STUDY_SORTS).default('changed'),
    /** Left out: titles from A, the others from the largest. */
    order: z.enum(SORT_ORDERS).optional(),
  }),
  response: z.object({ studies: z.array(studyRowSchema), next: z.string().nullable() }),
});

/** What the table can be filtered by. */
export const readStudyFilters = defineEndpoint({
  method: 'GET',
  path: '/api/study-filters',
  response: z.object({
    tags: z.array(z.object({ tag: z.string(), count: z.number().int() })),
    keys: z.array(studyDocumentSchema.shape.key),
  }),
});

/** Puts the viewer's tags of a study in place of those that were there. */
export const setStudyTags = defineEndpoint({
  method: 'PUT',
  path: '/api/studies/:studyId/tags',
  params: studyParams,
  body: z.strictObject({ tags: z.array(tagSchema).max(MAX_TAGS, `a study has at most ${MAX_TAGS} tags`) }),
  response: z.object({ tags: z.array(z.string()) }),
});

/** A study of the viewer's own like this one. */
export const duplicateStudy = defineEndpoint({
  method: 'POST',
  path: '/api/studies/:studyId/duplicates',
  params: studyParams,
  body: z.strictObject({ requestKey: requestKeySchema }),
  response: studySchema,
});

/** A deleted study can be restored for so long; then it goes for good. */
export const DAYS_IN_TRASH = 30;

export const listDeletedStudies = defineEndpoint({
  method: 'GET',
  path: '/api/deleted-studies',
  query: z.strictObject(pageQuery),
  response: z.object({
    studies: z.array(
      z.object({
        id: z.string(),
        title: z.string(),
        chordCount: z.number().int(),
        deletedAt: timeSchema,
        /** When it goes for good. */
        goesAt: timeSchema,
      }),
    ),
    next: z.string().nullable(),
  }),
});

export const createStudy = defineEndpoint({
  method: 'POST',
  path: '/api/studies',
  body: z.strictObject({ document: studyDocumentSchema, requestKey: requestKeySchema }),
  response: studySchema,
});

export const readStudy = defineEndpoint({
  method: 'GET',
  path: '/api/studies/:studyId',
  params: studyParams,
  response: studySchema,
});

/** What others had saved meanwhile, where a save was merged with theirs. */
export const mergedSchema = z.object({
  withNumber: z.number().int(),
  savedByNames: z.array(z.string()),
  chords: z.array(
    z.object({
      change: z.enum(['changed', 'added', 'removed']),
      place: z.number().int(),
      name: z.string().nullable(),
    }),
  ),
  settings: z.array(z.string()),
  reordered: z.boolean(),
});
export type Merged = z.infer<typeof mergedSchema>;

/** A study right after a save of it. */
export const savedStudySchema = studySchema.extend({ merged: mergedSchema.nullable() });
export type SavedStudy = z.infer<typeof savedStudySchema>;

/**
 * A save names the number it began from. A stale one is merged with what was saved meanwhile where the two changed
 * different chords; else it is set aside, answered 409 `study.stale` with {@link staleDetailsSchema}.
 */
export const saveStudy = defineEndpoint({
  method: 'PUT',
  path: '/api/studies/:studyId',
  params: studyParams,
  body: z.strictObject({
    document: studyDocumentSchema,
    basedOn: z.number().int().min(1),
    requestKey: requestKeySchema,
    deviceKey: deviceKeySchema,
  }),
  response: savedStudySchema,
});

/** What stands beside what: the newest save, and the one just refused, which is kept under its own number. */
export const staleDetailsSchema = z.object({
  newest: studySchema.extend({ savedByName: z.string() }),
  setAsideNumber: z.number().int(),
});
export type StaleDetails = z.infer<typeof staleDetailsSchema>;

export const renameStudy = defineEndpoint({
  method: 'PATCH',
  path: '/api/studies/:studyId',
  params: studyParams,
  body: z.strictObject({
    title: z.string().trim().min(1, 'a study needs a title').max(MAX_TITLE),
    basedOn: z.number().int().min(1),
    requestKey: requestKeySchema,
    deviceKey: deviceKeySchema,
  }),
  response: savedStudySchema,
});

export const deleteStudy = defineEndpoint({
  method: 'DELETE',
  path: '/api/studies/:studyId',
  params: studyParams,
  response: nothing,
});

/** Undoes a deletion. */
export const restoreStudy = defineEndpoint({
  method: 'POST',
  path: '/api/studies/:studyId/restorations',
  params: studyParams,
  response: studySchema,
});
