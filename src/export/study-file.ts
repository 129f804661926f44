import type { DraftDocument } from '#shared/study/draft';
import { draftDocumentSchema, STUDY_SCHEMA_VERSION } from '#shared/study/study.document';

/** A body of more than this the server refuses too. */
export const MOST_BYTES = 3_000_000;
const MEGABYTE = 1_000_000;
/** Faults told at once: more would not be read. */
const MOST_FAULTS = 5;
const INDENT = 2;

/** A study read from a file, or why it could not be. */
export type ReadStudy =
  | { readonly kind: 'study'; readonly document: DraftDocument }
  | { readonly kind: 'refused'; readonly message: string; readonly faults: readonly string[] };

/** @returns a study as the text of a file; its form is that of `schemaVersion` */
export function studyFileText(document: DraftDocument): string {
  return `${JSON.stringify(document, null, INDENT)}\n`;
}

function refused(message: string, faults: readonly string[] = []): ReadStudy {
  return { kind: 'refused', message, faults };
}

function versionOf(value: unknown): unknown {
  return typeof value === 'object' && value !== null && 'schemaVersion' in value ? value.schemaVersion : null;
}

/** Where in the file, as people count: `chord 2, voice 1, pitch`. */
function placeOf(path: readonly PropertyKey[]): string {
  const singular = (part: PropertyKey): string => String(part).replace(/s$/, '');
  const parts: string[] = [];
  path.forEach((part, index) => {
    if (typeof part === 'number') parts.push(`${singular(path[index - 1] ?? 'entry')} ${part + 1}`);
    else if (typeof path[index + 1] !== 'number') parts.push(String(part));
  });
  return parts.join(', ') || 'the study';
}

/**
 * Reads a study from the text of a file.
 * @param text as it was kept by {@link studyFileText}
 * @param bytes size of the file
 * @returns the study, or a message for the reader with the places of the first faults
 */
export function readStudyFile(text: string, bytes: number): ReadStudy {
  if (bytes > MOST_BYTES) {
    return refused(`The file is too large for a study: at most ${MOST_BYTES / MEGABYTE} MB are read.`);
  }
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    return refused('This is no study file: it cannot be read as JSON. Perhaps it was cut short on its way.');
  }
  const version = versionOf(value);
  if (typeof version === 'number' && version > STUDY_SCHEMA_VERSION) {
    return refused(
      `The file is of a newer form (${version}) than this program reads (${STUDY_SCHEMA_VERSION}).`,
    );
  }
  if (version !== STUDY_SCHEMA_VERSION) {
    return refused(`This is no study file: it has no schemaVersion ${STUDY_SCHEMA_VERSION}.`);
  }
  const parsed = draftDocumentSchema.safeParse(value);
  if (parsed.success) return { kind: 'study', document: parsed.data };
  const { issues } = parsed.error;
  const faults = issues.slice(0, MOST_FAULTS).map(({ path, message }) => `${placeOf(path)}: ${message}`);
  const more = issues.length - faults.length;
  return refused('The file holds no study that can be read.', [
    ...faults,
    ...(more > 0 ? [`and ${more} more`] : []),
  ]);
}
