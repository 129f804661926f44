import { nextTick } from 'vue';
import { EXAMPLE_CHORDS } from '#shared/study/examples';
import { comfortableReach } from '#shared/study/reach';
import { parseTypingLine } from '#shared/study/typing-line';
import { useTour } from '@/composables/tour';
import { useTypingActions } from '@/pages/lab/bench-actions';
import { useBenchStore } from '@/stores/bench.store';
import { useStudyStore } from '@/stores/study.store';

/** The tour, with something to speak of: an empty draft is lent an example, which undo takes away. */
export function useLabTour() {
  const bench = useBenchStore();
  const study = useStudyStore();
  const tour = useTour();
  const typing = useTypingActions(bench);

  async function lendExample(): Promise<void> {
    const [example] = EXAMPLE_CHORDS;
    const isEmptyDraft = study.study === null && bench.chord?.voices.length === 0;
    if (!isEmptyDraft || !example) return;
    typing.begin();
    typing.typed(
      parseTypingLine(example.line, 'english', comfortableReach(bench.study.ensemble.bass)).voices,
    );
    typing.end();
    await nextTick();
  }

  return { label: tour.label, leave: tour.leave, start: () => void tour.start(lendExample) };
}
