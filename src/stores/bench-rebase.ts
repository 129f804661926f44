import type { Ref, ShallowRef } from 'vue';
import type { DraftDocument } from '#shared/study/draft';
import type { History } from '@/stores/history';

/** How a state of the document takes something in; `null` where it cannot. */
export type TakingIn = (document: DraftDocument) => DraftDocument | null;

interface BenchState {
  readonly study: ShallowRef<DraftDocument>;
  readonly history: ShallowRef<History<DraftDocument>>;
  readonly gestureFrom: Ref<DraftDocument | null>;
}

/**
 * Takes in what was saved elsewhere: under the present and under every step that led to it, so that undo takes back
 * what was done here and nothing else.
 * @returns whether the present could take it in; nothing is changed where it could not
 */
export function rebaseBench({ study, history, gestureFrom }: BenchState, takeIn: TakingIn): boolean {
  const present = takeIn(study.value);
  if (!present) return false;
  const through = (steps: readonly DraftDocument[]) => steps.flatMap((step) => takeIn(step) ?? []);
  const { past, future } = history.value;
  history.value = { past: through(past), future: through(future) };
  gestureFrom.value = gestureFrom.value && (takeIn(gestureFrom.value) ?? present);
  study.value = present;
  return true;
}
