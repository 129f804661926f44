import { computed, type ComputedRef } from 'vue';
import type { HeldVoicing } from '@/components/compare/held-voicing';
import { comparedSide } from '@/pages/lab/compare/comparison';
import { useCompareStore } from '@/stores/compare.store';

/** The voicing that is held, as the bench lays it over its panes; nothing while none is. */
export function useHeldOnBench(): ComputedRef<HeldVoicing | null> {
  const compare = useCompareStore();
  return computed(() => {
    if (!compare.held) return null;
    const { voicing, analysis } = comparedSide(compare.held);
    return { chord: voicing.chord, analysis, ensemble: voicing.settings.ensemble };
  });
}
