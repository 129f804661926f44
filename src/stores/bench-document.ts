import { computed, ref, shallowRef } from 'vue';
import type { DraftDocument } from '#shared/study/draft';
import { newStudy } from '#shared/study/new-study';
import { rebaseBench, type TakingIn } from '@/stores/bench-rebase';
import { emptyHistory, remember, stepBack, stepForward, type History } from '@/stores/history';
import { newId } from '@/stores/ids';

/** The document with every step that led to it. A gesture, such as a drag, is one step however long it is. */
export function useBenchDocument() {
  const study = shallowRef<DraftDocument>(newStudy(newId()));
  const history = shallowRef<History<DraftDocument>>(emptyHistory());
  /** Shown and heard, not changed. */
  const readOnly = ref(false);
  /** Counts accepted changes since the document was opened. */
  const revision = ref(0);
  const savedRevision = ref(0);
  /** The document as it stood when the gesture in progress began. */
  const gestureFrom = shallowRef<DraftDocument | null>(null);

  const dirty = computed(() => revision.value !== savedRevision.value);
  const canUndo = computed(() => !readOnly.value && history.value.past.length > 0);
  const canRedo = computed(() => !readOnly.value && history.value.future.length > 0);

  function accept(before: DraftDocument): void {
    history.value = remember(history.value, before);
    revision.value += 1;
  }

  function change(next: DraftDocument): void {
    const before = study.value;
    if (readOnly.value || next === before) return;
    study.value = next;
    if (gestureFrom.value === null) accept(before);
  }

  function beginGesture(): void {
    gestureFrom.value ??= study.value;
  }

  function endGesture(): void {
    const before = gestureFrom.value;
    gestureFrom.value = null;
    if (before && before !== study.value) accept(before);
  }

  function cancelGesture(): void {
    study.value = gestureFrom.value ?? study.value;
    gestureFrom.value = null;
  }

  function step(take: typeof stepBack<DraftDocument>): void {
    endGesture();
    const taken = readOnly.value ? null : take(history.value, study.value);
    if (!taken) return;
    history.value = taken.history;
    study.value = taken.present;
    revision.value += 1;
  }

  const undo = (): void => step(stepBack);
  const redo = (): void => step(stepForward);

  function open(document: DraftDocument): void {
    gestureFrom.value = null;
    history.value = emptyHistory();
    revision.value = 0;
    savedRevision.value = 0;
    study.value = document;
  }

  const rebase = (takeIn: TakingIn): boolean => rebaseBench({ study, history, gestureFrom }, takeIn);

  /** @param saved the revision that was sent; changes made meanwhile stay unsaved */
  function markSaved(saved: number = revision.value): void {
    savedRevision.value = saved;
  }

  const state = { study, history, readOnly, revision, savedRevision, gestureFrom };
  const steps = { change, beginGesture, endGesture, cancelGesture, undo, redo };
  return { ...state, dirty, canUndo, canRedo, ...steps, open, rebase, markSaved };
}
