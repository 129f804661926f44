import { studyDocumentSchema, type StudyDocument } from '#shared/study/study.document';

/** Drivers hand JSON columns over as objects or as text. */
export function parseJson(column: unknown): unknown {
  return typeof column === 'string' ? JSON.parse(column) : column;
}

/** The one place where a kept document is read. */
export function readDocument(column: unknown): StudyDocument {
  return studyDocumentSchema.parse(parseJson(column));
}

/** What of a document stands in columns of its study, which is summed up anew later. */
export function columnsOf({ title, about, key, chords }: StudyDocument) {
  return {
    title,
    about,
    keyTonic: key.tonic,
    keyMode: key.mode,
    chordCount: chords.length,
    summaryDue: true,
  };
}
