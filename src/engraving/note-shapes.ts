import type { NoteValue } from '#shared/notation/note-values';

/** @returns whether a value is written with a stem: a half note and shorter */
export function hasStem({ sign }: NoteValue): boolean {
  return sign !== 'breve' && sign !== 1;
}
