import { computed, shallowRef, watch } from 'vue';
import type { NoteNaming } from '#shared/pitch/display';
import { comfortableReach } from '#shared/study/reach';
import type { Chord } from '#shared/study/study.document';
import { limitInForce, limitText } from '#shared/voicing/limits.sentences';
import type { WeighedMove } from '#shared/voicing/moves/weighed-moves';
import { analysisOf } from '@/composables/analysis';
import { useModelLimits } from '@/composables/model-limits';
import { useProgressionAnalyses } from '@/composables/progression-analyses';
import type { NotePair } from '@/components/findings/Findings.vue';
import { useChordTelling } from '@/pages/lab/chord-telling';
import { usePlayingView } from '@/pages/lab/playing-view';
import type { useBenchStore } from '@/stores/bench.store';

/** What the bench shows of the chord that is selected. */
export function useBenchView(
  bench: ReturnType<typeof useBenchStore>,
  chord: () => Chord,
  naming: () => NoteNaming,
) {
  const analysis = computed(() => analysisOf(chord(), bench.study));
  const analyses = useProgressionAnalyses(
    () => bench.study.chords,
    () => bench.study,
  );
  const telling = useChordTelling(bench, chord, () => analysis.value, naming);
  const reach = computed(() => comfortableReach(bench.study.ensemble.bass));
  const playing = usePlayingView(bench, chord, () => analysis.value, naming);
  const progression = computed(() =>
    bench.study.chords.map(({ id, beats }) => ({
      ...{ chordId: id, beats },
      sounds: analyses.value.get(id)?.voices ?? [],
    })),
  );

  /** The two notes that a finding points out. */
  const shown = shallowRef<NotePair | null>(null);
  /** The move whose voices are pointed out; one thing is shown at a time. */
  const shownMove = shallowRef<WeighedMove | null>(null);
  const markedIds = computed(() => {
    if (shownMove.value) return shownMove.value.ids;
    return shown.value ? [shown.value.lowerId, shown.value.upperId] : [];
  });
  const modelLimit = useModelLimits(
    () => analysis.value,
    () => bench.study.a4Hz,
    () => shown.value,
  );
  const shownLimit = computed(() => {
    const limit = shown.value ? modelLimit(shown.value.lowerId, shown.value.upperId) : null;
    return limit ? limitInForce(limit, bench.study.limits) : null;
  });
  /** @returns the limits of two notes in words; `null` until they are known */
  function limitOf({ lowerId, upperId }: NotePair): string | null {
    const limit = modelLimit(lowerId, upperId);
    return limit === undefined
      ? null
      : limitText(limit ?? undefined, bench.study.key, naming(), bench.study.limits);
  }
  function show(pair: NotePair | null, move: WeighedMove | null = null): void {
    shown.value = pair;
    shownMove.value = move;
  }
  watch(
    () => bench.chordId,
    () => {
      show(null);
      telling.askRegister(null);
    },
  );
  watch(chord, () => (shownMove.value = null));

  const pointing = { ...telling, shownLimit, limitOf, shown, shownMove, markedIds, show };
  return { analysis, analyses, reach, ...playing, progression, ...pointing };
}
