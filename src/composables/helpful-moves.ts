import { watchDebounced } from '@vueuse/core';
import { computed, shallowRef, watch, type Ref, type ShallowRef } from 'vue';
import type { Chord } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import type { WeighedMove } from '#shared/voicing/moves/weighed-moves';
import { settingsKey } from '@/composables/analysis';
import { pageJudge, type Judge } from '@/composables/judge';

export type MovesState = 'waiting' | 'ready' | 'error';

interface Found {
  readonly chord: Chord;
  readonly settings: string;
  readonly moves: readonly WeighedMove[] | null;
}

export interface HelpfulMoves {
  readonly state: Readonly<Ref<MovesState>>;
  /** Those of the chord as it stands now; empty until they are known. */
  readonly moves: Readonly<Ref<readonly WeighedMove[]>>;
}

/** A chord that has stood still for so long is taken to be meant: no frame of a drag is judged. */
const REST_MS = 250;

/** The moves that would clear a chord, worked out once it has stood still. */
export function useHelpfulMoves(
  chord: () => Chord,
  settings: () => SoundSettings,
  wanted: () => boolean,
  judge: Judge = pageJudge,
): HelpfulMoves {
  const found: ShallowRef<Found | null> = shallowRef(null);
  const now = computed(() => ({ chord: chord(), settings: settingsKey(settings()) }));
  const rested = shallowRef(now.value);
  const known = computed(() => {
    const { value } = found;
    return value?.chord === now.value.chord && value.settings === now.value.settings ? value : null;
  });
  const state = computed<MovesState>(() => {
    if (!known.value) return 'waiting';
    return known.value.moves ? 'ready' : 'error';
  });

  watchDebounced(now, (still) => (rested.value = still), { debounce: REST_MS });
  watch(
    [rested, wanted],
    async ([asked, isWanted]) => {
      if (!isWanted || known.value) return;
      const question = { chord: asked.chord, settings: settings() };
      const moves = await judge.ask('moves', question).catch(() => null);
      if (asked === rested.value) found.value = { ...asked, moves };
    },
    { immediate: true },
  );
  return { state, moves: computed(() => known.value?.moves ?? []) };
}
