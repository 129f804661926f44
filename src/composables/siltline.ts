import { watchDebounced } from '@vueuse/core';
import { computed, shallowRef, triggerRef, type ComputedRef } from 'vue';
import type { Hertz } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import { sectionPairOf } from '#shared/voicing/limits.sentences';
import type { SectionPair } from '#shared/voicing/section-pairs';
import type { SiltlineExtent, SiltlineMap } from '#shared/voicing/siltline-map';
import { pageJudge, type Judge } from '@/composables/judge';

/** The map of two sections, once it is known. */
export interface Siltline {
  readonly pair: SectionPair;
  readonly map: SiltlineMap;
}

/** From the lowest open string to C6, and intervals up to two octaves. */
const EXTENT: SiltlineExtent = { lowest: 23, highest: 84, widest: 24 };
const REST_MS = 300;
const MOST_KEPT = 24;

const known = shallowRef(new Map<string, SiltlineMap>());
const asked = new Set<string>();

/** The selected note's section, with the section of the next note above it; its own where none is above. */
function pairFor(voices: readonly VoiceSound[], id: string | null, a4Hz: Hertz): SectionPair | null {
  const lower = voices.find((voice) => voice.id === id);
  if (!lower) return null;
  const [upper] = voices.filter(({ midi }) => midi > lower.midi).sort((a, b) => a.midi - b.midi);
  return sectionPairOf(lower, upper ?? lower, a4Hz);
}

/**
 * The siltline for a note: worked out beside the page, once for two sections that play in one way.
 * @param id of the note that is selected or pointed at
 */
export function useSiltline(
  voices: () => readonly VoiceSound[],
  id: () => string | null,
  a4Hz: () => Hertz,
  judge: Judge = pageJudge,
): ComputedRef<Siltline | null> {
  const pair = computed(() => pairFor(voices(), id(), a4Hz()));
  const key = computed(() => JSON.stringify(pair.value));

  async function ask(wanted: SectionPair): Promise<void> {
    const name = JSON.stringify(wanted);
    if (known.value.has(name) || asked.has(name)) return;
    asked.add(name);
    const map = await judge.ask('siltline', { pair: wanted, extent: EXTENT }).catch(() => null);
    asked.delete(name);
    if (!map) return;
    known.value.set(name, map);
    const [oldest] = known.value.keys();
    if (known.value.size > MOST_KEPT && oldest !== undefined) known.value.delete(oldest);
    triggerRef(known);
  }

  watchDebounced(key, () => pair.value && void ask(pair.value), { debounce: REST_MS, immediate: true });
  return computed(() => {
    const map = known.value.get(key.value);
    return pair.value && map ? { pair: pair.value, map } : null;
  });
}
