import { ref, watch } from 'vue';

/** What stands under the bench while two voicings are compared. */
export type CompareView = 'comparison' | 'beside' | 'findings';

/**
 * What of a comparison lies open.
 * @param differs whether A and B are not the same
 */
export function useCompareView(differs: () => boolean) {
  const view = ref<CompareView>('comparison');
  /** What had the focus has been taken away: the comparison's heading is to have it. */
  const headingAsked = ref(false);
  /** A and B are the same yet: what would help lies open until something of it is tried. */
  let awaitsChange = false;

  function show(what: CompareView): void {
    view.value = what;
    awaitsChange = false;
  }

  function showUntilChanged(what: CompareView): void {
    view.value = what;
    awaitsChange = true;
  }

  // At once, so that the page changes but once.
  watch(differs, (they) => they && awaitsChange && show('comparison'), { flush: 'sync' });
  return { view, headingAsked, show, showUntilChanged };
}
