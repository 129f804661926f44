import { computed } from 'vue';
import type { NoteNaming } from '#shared/pitch/display';
import type { Chord } from '#shared/study/study.document';
import type { ChordAnalysis } from '#shared/voicing/analysis';
import { playingRemarks, playingText } from '#shared/voicing/playing.sentences';
import { factsOf } from '#shared/voicing/voice.sentences';
import type { useBenchStore } from '@/stores/bench.store';

/** How the chord lies under its players' hands, and the selected note among them. */
export function usePlayingView(
  bench: ReturnType<typeof useBenchStore>,
  chord: () => Chord,
  analysis: () => ChordAnalysis,
  naming: () => NoteNaming,
) {
  const by = computed(() => {
    const { ensemble, a4Hz, key } = bench.study;
    return { ensemble, a4Hz, key, naming: naming() };
  });
  const outOfReach = computed(() => playingRemarks(chord(), by.value));
  const voiceFacts = computed(() => {
    const facts = factsOf(analysis().voices.find(({ id }) => id === bench.voiceId));
    return bench.voice ? `${facts}; ${playingText(bench.voice, chord(), by.value)}` : facts;
  });
  return { outOfReach, voiceFacts };
}
