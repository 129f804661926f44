import { studyDocumentSchema, type StudyDocument } from '#shared/study/study.document';

/** The one place where a kept document is read: drivers hand JSON columns over as objects or as text. */
export function readDocument(column: unknown): StudyDocument {
  return studyDocumentSchema.parse(typeof column === 'string' ? JSON.parse(column) : column);
}
