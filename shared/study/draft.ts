import type { z } from 'zod';
import type { draftDocumentSchema } from '#shared/study/study.document';

/** What the bench works on: a study in which a chord may still be empty. Changes never alter it, each makes a new one. */
export type DraftDocument = z.infer<typeof draftDocumentSchema>;
