import { computed, ref, watch } from 'vue';
import type { NoteNaming } from '#shared/pitch/display';
import { comfortableReach } from '#shared/study/reach';
import type { Chord } from '#shared/study/study.document';
import { reachOf } from '#shared/voicing/reach.sentences';
import { findingsOf } from '#shared/voicing/sentences';
import { factsOf } from '#shared/voicing/voice.sentences';
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
  const shown = ref<NotePair | null>(null);
  const markedIds = computed(() => (shown.value ? [shown.value.lowerId, shown.value.upperId] : []));
  watch(
    () => bench.chordId,
    () => (shown.value = null),
  );

  return { analysis, analyses, findings, reach, outOfReach, voiceFacts, progression, shown, markedIds };
}
