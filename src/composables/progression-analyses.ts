import { computed, onScopeDispose, ref, watch, type ComputedRef } from 'vue';
import type { Chord } from '#shared/study/study.document';
import type { ChordAnalysis, SoundSettings } from '#shared/voicing/analysis';
import { analysisOf, knownAnalysis } from '@/composables/analysis';

/** Work in one go, in milliseconds: under half a frame, so that nobody feels it. */
const SLICE_MS = 8;

/** Judges the chords of a progression a few at a time; those judged before are there at once. */
export function useProgressionAnalyses(
  chords: () => readonly Chord[],
  settings: () => SoundSettings,
): ComputedRef<ReadonlyMap<string, ChordAnalysis>> {
  const rounds = ref(0);
  let frame = 0;

  const analyses = computed(() => {
    void rounds.value;
    const known = chords().flatMap((chord) => {
      const analysis = knownAnalysis(chord, settings());
      return analysis ? [[chord.id, analysis] as const] : [];
    });
    return new Map(known);
  });

  function work(): void {
    frame = 0;
    const end = performance.now() + SLICE_MS;
    const waiting = chords().filter((chord) => !knownAnalysis(chord, settings()));
    for (const chord of waiting) {
      analysisOf(chord, settings());
      if (performance.now() > end) break;
    }
    rounds.value += 1;
  }

  watch(
    [chords, settings, rounds],
    () => {
      if (chords().some((chord) => !knownAnalysis(chord, settings()))) frame ||= requestAnimationFrame(work);
    },
    { immediate: true },
  );
  onScopeDispose(() => cancelAnimationFrame(frame));
  return analyses;
}
