import { defineStore } from 'pinia';
import { computed, shallowRef } from 'vue';
import { same } from '#shared/study/same';
import { voicingsOf, type Voicing } from '#shared/study/voicing';
import { useBenchStore } from '@/stores/bench.store';
import { chordBefore } from '@/stores/chord-before';
import { useCompareView } from '@/stores/compare-view';

/** As many small profiles as stand side by side. */
export const MOST_BESIDE = 8;
const BEFORE_CHANGES = 'as it was before your changes';

/** Several voicings side by side. */
function useBeside() {
  const beside = shallowRef<readonly Voicing[]>([]);

  function add(voicings: readonly Voicing[]): void {
    beside.value = [...beside.value, ...voicings].slice(0, MOST_BESIDE);
  }

  function remove(voicing: Voicing): void {
    beside.value = beside.value.filter((other) => other !== voicing);
  }

  return { beside, add, remove };
}

/** Two voicings beside each other: one is held, the other lies on the bench, or is brought from elsewhere. */
export const useCompareStore = defineStore('compare', () => {
  const bench = useBenchStore();
  /** A: as it was when it was held, whatever becomes of its chord. */
  const held = shallowRef<Voicing | null>(null);
  /** B, where it is not the chord on the bench: only looked at. */
  const guest = shallowRef<Voicing | null>(null);
  const { beside, ...stood } = useBeside();

  const onBench = computed(
    () =>
      voicingsOf(bench.study, { studyId: null, number: null, from: 'on the bench' }).find(
        ({ chord }) => chord.id === bench.chordId,
      ) ?? null,
  );
  /** B. */
  const now = computed(() => guest.value ?? onBench.value);

  const { view, headingAsked, show, showUntilChanged } = useCompareView(
    () => !same(held.value?.chord.voices, now.value?.chord.voices),
  );

  function hold(voicing: Voicing | null): void {
    if (held.value === null || voicing === null) show('comparison');
    held.value = voicing;
    if (voicing === null) guest.value = null;
  }

  /** Holds the chord on the bench as it is. */
  function holdNow(): void {
    if (!now.value) return;
    bench.endGesture();
    hold({ ...now.value, from: guest.value ? now.value.from : 'as it was when held' });
    guest.value = null;
    show('comparison');
  }

  /** Holds the chord on the bench as it was before its latest changes, or as it is where it has none. */
  function begin(): void {
    bench.endGesture();
    const [past, present, { chordId }] = [bench.history.past, bench.study, bench];
    const before = guest.value ? null : chordBefore({ past, present, chordId });
    if (before && onBench.value) hold({ ...onBench.value, chord: before, from: BEFORE_CHANGES });
    else {
      holdNow();
      if (!bench.readOnly) showUntilChanged('findings');
    }
  }

  /** Takes B from elsewhere; with nothing it is the chord on the bench again. */
  function bring(voicing: Voicing | null): void {
    guest.value = voicing;
    // Its findings are not told: it does not lie on the bench.
    if (voicing && view.value === 'findings') show('comparison');
  }

  function clear(): void {
    hold(null);
    beside.value = [];
  }

  const comparing = computed(() => held.value !== null);
  /** A is what the chord on the bench was before its changes, not what it was when Compare was pressed. */
  const heldBefore = computed(
    () => held.value?.from === BEFORE_CHANGES && now.value?.chord.id === held.value.chord.id,
  );
  /** What clouds in the chord on the bench is told where that chord lies in view. */
  const tellsFindings = computed(
    () => !comparing.value || (view.value === 'findings' && guest.value === null),
  );
  const sides = { held, guest, now, onBench, comparing, heldBefore };
  const state = { ...sides, beside, view, headingAsked, tellsFindings };
  return { ...state, hold, holdNow, begin, show, bring, ...stood, clear };
});
