import { watch } from 'vue';
import type { useCompareStore } from '@/stores/compare.store';

/**
 * Where beginning, ending or turning to a comparison takes away what had the focus, the comparison's heading gets it,
 * or what began and ended it.
 * @param button the button of that
 */
export function useKeptFocus(
  compare: ReturnType<typeof useCompareStore>,
  button: () => HTMLElement | undefined,
): void {
  const shown = [() => compare.comparing, () => compare.view];
  let before: Element | null = null;
  // Before the page follows, and once it has.
  watch(shown, () => (before ??= document.activeElement), { flush: 'sync' });
  watch(
    shown,
    () => {
      const isLost = before?.isConnected === false && document.activeElement === document.body;
      before = null;
      if (!isLost) return;
      if (compare.comparing && compare.view === 'comparison') compare.headingAsked = true;
      else button()?.focus();
    },
    { flush: 'post' },
  );
}
