import { computed, shallowRef, watch } from 'vue';
import type { NoteNaming } from '#shared/pitch/display';
import { comfortableReach } from '#shared/study/reach';
import type { Chord } from '#shared/study/study.document';
import { reachOf } from '#shared/voicing/reach.sentences';
import { findingsOf } from '#shared/voicing/sentences';
import { factsOf } from '#shared/voicing/voice.sentences';
import type { WeighedMove } from '#shared/voicing/moves/weighed-moves';
import { analysisOf } from '@/composables/analysis';
import { useProgressionAnalyses } from '@/composables/progression-analyses';
import type { NotePair } from '@/components/findings/Findings.vue';
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
  const findings = computed(() => findingsOf(analysis.value, naming()));
  const reach = computed(() => comfortableReach(bench.study.ensemble.bass));
  const outOfReach = computed(() =>
    chord()
      .voices.map((voice) => reachOf(voice, bench.study.ensemble.bass, bench.study.key, naming()))
      .filter(({ lying }) => lying === 'beyond'),
  );
  const voiceFacts = computed(() => factsOf(analysis.value.voices.find(({ id }) => id === bench.voiceId)));
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
  function show(pair: NotePair | null, move: WeighedMove | null = null): void {
    shown.value = pair;
    shownMove.value = move;
  }
  watch(
    () => bench.chordId,
    () => show(null),
  );
  watch(chord, () => (shownMove.value = null));

  const pointing = { shown, shownMove, markedIds, show };
  return { analysis, analyses, findings, reach, outOfReach, voiceFacts, progression, ...pointing };
}
