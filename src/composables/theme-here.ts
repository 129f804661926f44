import { onScopeDispose, watch } from 'vue';
import { useTheme } from '@/composables/theme';

/** Gives the page colours of its own while it is open; the reader's choice comes back after it. */
export function useThemeHere(wanted: () => 'light' | 'dark'): void {
  const { shown } = useTheme();
  const set = (theme: 'light' | 'dark'): void => void (document.documentElement.dataset.theme = theme);
  watch([wanted, shown], ([theme]) => set(theme), { immediate: true, flush: 'post' });
  onScopeDispose(() => set(shown.value));
}
