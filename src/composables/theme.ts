import { useLocalStorage, usePreferredDark } from '@vueuse/core';
import { computed, watchEffect, type ComputedRef, type Ref } from 'vue';

export const THEME_CHOICES = ['light', 'dark', 'system'] as const;
export type ThemeChoice = (typeof THEME_CHOICES)[number];

/** The same key that public/theme.js reads before the first paint. */
const THEME_KEY = 'siltline.theme';

export interface Theme {
  readonly choice: Ref<ThemeChoice>;
  /** What is shown, once the system has been asked. */
  readonly shown: ComputedRef<'light' | 'dark'>;
}

/** The colours that the reader chose, kept in this browser and set on the page. */
export function useTheme(): Theme {
  const choice = useLocalStorage<ThemeChoice>(THEME_KEY, 'system');
  const prefersDark = usePreferredDark();
  const shown = computed(() => {
    if (choice.value === 'light' || choice.value === 'dark') return choice.value;
    return prefersDark.value ? 'dark' : 'light';
  });
  watchEffect(() => {
    document.documentElement.dataset.theme = shown.value;
  });
  return { choice, shown };
}
