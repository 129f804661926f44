import { computed, ref, type ComputedRef } from 'vue';
import type { Chord, Voice } from '#shared/study/study.document';

/** Which notes of the chord are selected. One of them leads: it has the focus, and its facts are shown. */
export function useVoiceSelection(chord: ComputedRef<Chord | undefined>) {
  /** What was selected last; undo may have taken it away. */
  const wantedId = ref<string | null>(null);
  const wantedIds = ref<readonly string[]>([]);

  const voice = computed(() => chord.value?.voices.find(({ id }) => id === wantedId.value) ?? null);
  const voiceId = computed(() => voice.value?.id ?? null);
  const voices = computed<readonly Voice[]>(() =>
    (chord.value?.voices ?? []).filter(({ id }) => id === voiceId.value || wantedIds.value.includes(id)),
  );
  const voiceIds = computed(() => voices.value.map(({ id }) => id));

  /** Selects one note alone; one that is selected with others leads them. */
  function selectVoice(id: string | null): void {
    if (id === null || !voiceIds.value.includes(id)) wantedIds.value = id === null ? [] : [id];
    wantedId.value = id;
  }

  function selectVoices(ids: readonly string[]): void {
    wantedIds.value = ids;
    if (wantedId.value === null || !ids.includes(wantedId.value)) wantedId.value = ids.at(-1) ?? null;
  }

  /** Adds a note to those that are selected, or takes it out again. */
  function toggleVoice(id: string): void {
    const others = voiceIds.value.filter((other) => other !== id);
    if (others.length < voiceIds.value.length) return selectVoices(others);
    wantedIds.value = [...others, id];
    wantedId.value = id;
  }

  return { voice, voiceId, voices, voiceIds, selectVoice, selectVoices, toggleVoice };
}
