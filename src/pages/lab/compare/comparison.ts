import { computed } from 'vue';
import type { NoteNaming } from '#shared/pitch/display';
import type { Voicing } from '#shared/study/voicing';
import type { Side } from '#shared/voicing/blind-rounds';
import { characterOf } from '#shared/voicing/character';
import { characterFigures } from '#shared/voicing/character.sentences';
import { compareVoicings } from '#shared/voicing/comparison';
import { soundSettingsOf } from '#shared/voicing/settings';
import type { ComparedSide } from '@/components/compare/compared-side';
import type { FigureRow } from '@/components/compare/CompareTable.vue';
import { analysisOf } from '@/composables/analysis';
import type { useCompareStore } from '@/stores/compare.store';

/** Judges a voicing under the settings of its own study. */
export function comparedSide(voicing: Voicing): ComparedSide {
  return { voicing, analysis: analysisOf(voicing.chord, soundSettingsOf(voicing.settings)) };
}

/** What the comparison of A and B comes to; nothing while none is held. */
export function useComparison(compare: ReturnType<typeof useCompareStore>) {
  const held = computed(() => compare.held && comparedSide(compare.held));
  const now = computed(() => compare.now && comparedSide(compare.now));
  return computed(() => {
    if (!held.value || !now.value) return null;
    const sides: Readonly<Record<Side, ComparedSide>> = { held: held.value, now: now.value };
    return { sides, comparison: compareVoicings(held.value.analysis, now.value.analysis) };
  });
}

/** The first of the figures is told by the comparison itself. */
const TOLD_BESIDE = 'Under low limits';

/** The figures of both besides muddiness, each in its own key. */
export function figureRows(
  sides: Readonly<Record<Side, ComparedSide>>,
  naming: NoteNaming,
): readonly FigureRow[] {
  const of = ({ voicing, analysis }: ComparedSide) =>
    characterFigures(
      characterOf(analysis.voices, voicing.settings.a4Hz),
      analysis.limits.length,
      voicing.settings.key,
      naming,
    );
  const now = new Map(of(sides.now).map(({ name, value }) => [name, value]));
  return of(sides.held)
    .filter(({ name }) => name !== TOLD_BESIDE)
    .map(({ name, value }) => ({ name, held: value, now: now.get(name) ?? '' }));
}
