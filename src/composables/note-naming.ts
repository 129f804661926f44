import { useLocalStorage } from '@vueuse/core';
import { computed, type WritableComputedRef } from 'vue';
import { NOTE_NAMINGS, type NoteNaming } from '#shared/pitch/display';

const NAMING_KEY = 'siltline.note-names';

/** How the reader names notes, kept in this browser. */
export function useNoteNaming(): WritableComputedRef<NoteNaming> {
  const kept = useLocalStorage<string>(NAMING_KEY, 'english');
  return computed({
    get: () => NOTE_NAMINGS.find((naming) => naming === kept.value) ?? 'english',
    set: (naming) => (kept.value = naming),
  });
}
