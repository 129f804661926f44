import { watchDebounced } from '@vueuse/core';
import { shallowRef, triggerRef } from 'vue';
import type { ChordAnalysis, VoiceSound } from '#shared/voicing/analysis';
import { sectionPairOf } from '#shared/voicing/limits.sentences';
import type { ModelLimit } from '#shared/voicing/model-limits';
import type { Hertz } from '#shared/units';
import { pageJudge, type Judge } from '@/composables/judge';

/** The limit of a pair of notes, once it is known; `null` where its interval has none. */
export type LimitOf = (lowerId: string, upperId: string) => ModelLimit | null | undefined;

type Pair = readonly [VoiceSound, VoiceSound];

/** A chord that has stood still for so long is taken to be meant. */
const REST_MS = 300;
/** As many kinds of pairs are kept as a long evening needs; the oldest go first. */
const MOST_KEPT = 200;

/** Worked out once for two sections that play in one way, whatever the chord. */
const known = shallowRef(new Map<string, readonly ModelLimit[]>());
const asked = new Set<string>();

/**
 * The limits that the model derives for the sections at hand, beside the chart's: for pairs under
 * their limit and the pair that is asked about, once the chord stands still.
 * @param shown the pair that is asked about
 */
export function useModelLimits(
  analysis: () => ChordAnalysis,
  a4Hz: () => Hertz,
  shown: () => { readonly lowerId: string; readonly upperId: string } | null,
  judge: Judge = pageJudge,
): LimitOf {
  const pairOf = (lowerId: string, upperId: string): Pair | null => {
    const { voices } = analysis();
    const [lower, upper] = [voices.find(({ id }) => id === lowerId), voices.find(({ id }) => id === upperId)];
    return lower && upper ? [lower, upper] : null;
  };
  const keyOf = ([lower, upper]: Pair): string => JSON.stringify(sectionPairOf(lower, upper, a4Hz()));

  async function ask(pair: Pair): Promise<void> {
    const key = keyOf(pair);
    if (known.value.has(key) || asked.has(key)) return;
    asked.add(key);
    const limits = await judge.ask('limits', sectionPairOf(...pair, a4Hz())).catch(() => null);
    asked.delete(key);
    if (!limits) return;
    known.value.set(key, limits);
    const [oldest] = known.value.keys();
    if (known.value.size > MOST_KEPT && oldest !== undefined) known.value.delete(oldest);
    triggerRef(known);
  }

  watchDebounced(
    [analysis, shown],
    () => {
      const wanted = [...analysis().limits, ...(shown() ? [shown()] : [])];
      for (const pair of wanted) {
        const found = pair && pairOf(pair.lowerId, pair.upperId);
        if (found) void ask(found);
      }
    },
    { debounce: REST_MS, immediate: true },
  );

  return (lowerId, upperId) => {
    const pair = pairOf(lowerId, upperId);
    const limits = pair && known.value.get(keyOf(pair));
    if (!pair || !limits) return undefined;
    const semitones = pair[1].midi - pair[0].midi;
    return limits.find((limit) => limit.semitones === semitones) ?? null;
  };
}
