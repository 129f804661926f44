import { computed, ref, watch } from 'vue';
import { applyMove } from '#shared/study/moved.changes';
import { purposeOf, setOnPurpose, type Purpose } from '#shared/study/on-purpose.changes';
import type { Chord } from '#shared/study/study.document';
import type { ChordAnalysis } from '#shared/voicing/analysis';
import type { WeighedMove } from '#shared/voicing/moves/weighed-moves';
import { CLEAR_BELOW } from '#shared/voicing/sentences';
import { soundSettingsOf } from '#shared/voicing/settings';
import { WHOLE_CHORD } from '@/audio/listening';
import { keyOfMove, type HelpState } from '@/components/findings/help-text';
import { analysisOf } from '@/composables/analysis';
import { useHelpfulMoves } from '@/composables/helpful-moves';
import { usePlayback } from '@/composables/playback';
import type { useBenchStore } from '@/stores/bench.store';

/** What would help the selected chord, to be heard and made; and what of its clouding is meant. */
export function useHelp(
  bench: ReturnType<typeof useBenchStore>,
  chord: () => Chord,
  analysis: () => ChordAnalysis,
) {
  const playback = usePlayback();
  /** Moves were asked for although the chord clouds on purpose. */
  const asked = ref(false);
  const purpose = computed(() => purposeOf(chord(), analysis().muddiness.register));
  const isClear = computed(() => analysis().muddiness.index < CLEAR_BELOW);
  const wanted = computed(() => !isClear.value && (purpose.value === null || asked.value));
  const found = useHelpfulMoves(
    chord,
    () => soundSettingsOf(bench.study),
    () => wanted.value,
  );
  const state = computed<HelpState>(() => {
    if (chord().voices.length < 2) return 'empty';
    return isClear.value ? 'clear' : found.state.value;
  });
  const heard = computed(() => {
    const { value: part } = playback.heard;
    return part?.kind === 'trial' ? part.key : null;
  });

  function hear(move: WeighedMove): void {
    const { voices } = analysisOf(applyMove(chord(), move), bench.study);
    void playback.hear({ kind: 'trial', key: keyOfMove(move), sounds: voices });
  }

  /** One step, which undo takes back. */
  function make(move: WeighedMove): void {
    bench.endGesture();
    bench.changeCurrentChord((current) => applyMove(current, move));
  }

  function ask(wish: boolean): void {
    asked.value = wish;
  }

  function mean(what: Purpose, meant: boolean): void {
    bench.changeCurrentChord((current) => setOnPurpose(current, what, meant));
  }

  watch(
    () => bench.chordId,
    () => (asked.value = false),
  );
  // What was heard in the chord's place is none of it any more: what is heard is the chord itself again.
  watch(chord, () => {
    if (heard.value !== null) void playback.hear(WHOLE_CHORD);
  });
  return { purpose, asked, state, moves: found.moves, heard, hear, make, mean, ask };
}
