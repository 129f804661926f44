import { computed } from 'vue';
import type { NoteNaming } from '#shared/pitch/display';
import type { SpellingKey } from '#shared/pitch/spelling';
import type { ChordAnalysis } from '#shared/voicing/analysis';
import { roomText } from '#shared/voicing/siltline.sentences';
import { useSiltline } from '@/composables/siltline';

interface Shown {
  readonly analysis: ChordAnalysis;
  readonly selectedId: string | null;
  readonly a4Hz: number;
  readonly spelling: SpellingKey;
  readonly naming: NoteNaming;
}

/** The room that the selected note needs above it. */
export function useBenchRoom(props: Shown) {
  const note = computed(() => props.analysis.voices.find(({ id }) => id === props.selectedId));
  const midi = computed(() => note.value?.midi ?? null);
  const siltline = useSiltline(
    () => props.analysis.voices,
    () => props.selectedId,
    () => props.a4Hz,
  );
  const text = computed(() => {
    if (!siltline.value || midi.value === null) return null;
    const { map, pair } = siltline.value;
    return roomText(map, pair, midi.value, props.spelling, props.naming);
  });
  const shown = computed(() =>
    siltline.value && midi.value !== null
      ? { siltline: siltline.value, midi: midi.value, text: text.value }
      : null,
  );
  return { midi, siltline, text, shown };
}
