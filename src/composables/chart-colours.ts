import { useMutationObserver } from '@vueuse/core';
import { shallowRef, type ShallowRef } from 'vue';
import type { ChartColours } from '@/charts/overtones';
import { sectionToken } from '@/charts/section-colours';

function read(): ChartColours {
  const style = getComputedStyle(document.documentElement);
  const token = (name: string): string => style.getPropertyValue(name).trim();
  return {
    sections: {
      violin1: token(sectionToken('violin1')),
      violin2: token(sectionToken('violin2')),
      viola: token(sectionToken('viola')),
      cello: token(sectionToken('cello')),
      doubleBass: token(sectionToken('doubleBass')),
    },
    ink: token('--ink'),
    quiet: token('--ink-quiet'),
    line: token('--line'),
    surface: token('--surface'),
  };
}

/** The page's colours for a canvas, read again when light and dark change. */
export function useChartColours(): Readonly<ShallowRef<ChartColours>> {
  const colours = shallowRef(read());
  useMutationObserver(document.documentElement, () => (colours.value = read()), {
    attributeFilter: ['data-theme'],
  });
  return colours;
}
