import { ref, watch, type Ref, type ShallowRef } from 'vue';
import { newStudy } from '#shared/study/new-study';
import type { DraftDocument } from '#shared/study/draft';
import {
  browserStorage,
  forgetSetAside,
  readDraft,
  readSetAside,
  writeDraft,
  writeSetAside,
} from '@/stores/draft-storage';
import { newId } from '@/stores/ids';

/**
 * Keeps the draft in the browser after every accepted change, while the bench holds the draft and not a
 * saved study. One that cannot be read is set aside for the reader to take away.
 */
export function useDraftKeeping(
  study: Readonly<ShallowRef<DraftDocument>>,
  revision: Readonly<Ref<number>>,
  open: (document: DraftDocument) => void,
) {
  const storage = browserStorage();
  const holdsDraft = ref(false);
  const setAside = ref(readSetAside(storage));
  /** Whether the browser kept the last change. */
  const draftKept = ref(storage !== null);

  /** Puts the browser's draft on the bench, or a new study where there is none. */
  function openDraft(): void {
    const kept = readDraft(storage);
    if (kept.kind === 'unreadable') setAside.value = kept.text;
    open(kept.kind === 'draft' ? kept.document : newStudy(newId()));
    holdsDraft.value = true;
  }

  /** From here on the bench holds a saved study; the draft stays in the browser as it is. */
  function leaveDraft(): void {
    holdsDraft.value = false;
  }

  /** The draft has become a study: begins a new one. */
  function clearDraft(): void {
    draftKept.value = writeDraft(storage, newStudy(newId()));
  }

  /** Unsaved work that cannot be read is shown to be taken away, like such a draft. */
  function putAside(text: string): void {
    writeSetAside(storage, text);
    setAside.value = text;
  }

  function discardSetAside(): void {
    forgetSetAside(storage);
    setAside.value = null;
  }

  watch(
    revision,
    () => {
      if (holdsDraft.value) draftKept.value = writeDraft(storage, study.value);
    },
    { flush: 'sync' },
  );

  return { holdsDraft, setAside, draftKept, openDraft, leaveDraft, clearDraft, putAside, discardSetAside };
}
