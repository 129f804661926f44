import { shallowRef, watch, type ShallowRef } from 'vue';
import { loadEngraver, type Engraver } from '@/engraving/engraver';

/** A page that is never idle gets its notation all the same. */
const LONGEST_WAIT_MS = 1500;

/**
 * The engraver, once it is needed and the page has nothing else to do.
 * @param wanted whether there is anything to engrave
 */
export function useEngraver(wanted: () => boolean): {
  readonly engraver: Readonly<ShallowRef<Engraver | null>>;
  readonly failed: Readonly<ShallowRef<boolean>>;
} {
  const engraver = shallowRef<Engraver | null>(null);
  const failed = shallowRef(false);

  function load(): void {
    failed.value = false;
    loadEngraver().then(
      (loaded) => (engraver.value = loaded),
      () => (failed.value = true),
    );
  }

  const stop = watch(
    wanted,
    (is) => {
      if (!is || engraver.value) return;
      if ('requestIdleCallback' in window) requestIdleCallback(load, { timeout: LONGEST_WAIT_MS });
      else setTimeout(load);
    },
    { immediate: true },
  );
  watch(engraver, (loaded) => loaded && stop());
  return { engraver, failed };
}
