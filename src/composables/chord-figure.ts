import { computed, type ComputedRef } from 'vue';
import type { NotatedStudy } from '#shared/notation/system-plan';
import { useEngraver } from '@/composables/engraver';
import { chordFigure } from '@/export/figure/figure';
import type { FigureInput } from '@/export/figure/figure-input';
import { figureStaves } from '@/export/figure/figure-staves';
import type { SvgNode } from '@/export/svg/nodes';

export type FigureSource = Omit<FigureInput, 'staves' | 'ensemble'> & { readonly study: NotatedStudy };

/** The bench as a figure that follows its chord; the staves come as soon as the notation is at hand. */
export function useChordFigure(source: () => FigureSource): {
  readonly figure: ComputedRef<SvgNode>;
  /** All that will be drawn is drawn. */
  readonly ready: ComputedRef<boolean>;
} {
  const { engraver, failed } = useEngraver(() => source().layout.panes.system !== undefined);
  const staves = computed(() => (engraver.value ? figureStaves(engraver.value, source()) : []));
  const figure = computed(() => {
    const { study, ...input } = source();
    return chordFigure({ ...input, ensemble: study.ensemble, staves: staves.value });
  });
  const ready = computed(
    () => failed.value || engraver.value !== null || source().layout.panes.system === undefined,
  );
  return { figure, ready };
}
