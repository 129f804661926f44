import { computed, watch } from 'vue';
import { useRoute, useRouter, type LocationQueryRaw } from 'vue-router';
import type { Voicing } from '#shared/study/voicing';
import { placeText } from '#shared/study/voicing-place';
import { notice } from '@/composables/notices';
import { BETWEEN, NAMES, readAddress } from '@/pages/lab/compare/address-reading';
import { useBenchTaking } from '@/pages/lab/compare/bench-taking';
import { useVoicingSources } from '@/pages/lab/compare/sources';
import { useBenchStore } from '@/stores/bench.store';
import { useCompareStore } from '@/stores/compare.store';
import { useStudyStore } from '@/stores/study.store';

const GONE = 'Not all that this link compares is there any more, or it is not shared with you.';

/** What is compared, as an address names it. */
function useWrittenAddress() {
  const bench = useBenchStore();
  const compare = useCompareStore();

  /** A chord that has changed since it was held is kept nowhere: no link can name it. */
  function written(voicing: Voicing | null): string | undefined {
    if (!voicing?.place) return undefined;
    const isKept = voicing.place.studyId !== null || bench.study.chords.includes(voicing.chord);
    return isKept ? placeText(voicing.place) : undefined;
  }

  return computed<LocationQueryRaw>(() => {
    const [a, b] = [written(compare.held), written(compare.now)];
    const beside = compare.beside.flatMap((voicing) => written(voicing) ?? []).join(BETWEEN);
    // As long as nothing has changed there is nothing to compare.
    if (a === undefined || (a === b && beside === '')) return {};
    return { [NAMES.held]: a, [NAMES.now]: b, [NAMES.beside]: beside === '' ? undefined : beside };
  });
}

/** Keeps what is compared in the address, and compares what the address names, once its study lies open. */
export function useCompareAddress(): void {
  const route = useRoute();
  const router = useRouter();
  const bench = useBenchStore();
  const study = useStudyStore();
  const compare = useCompareStore();
  const taking = useBenchTaking(bench, compare);
  const sources = useVoicingSources();
  const address = useWrittenAddress();
  let reading = false;

  /** A voicing that was held here goes on being held, also when a draft becomes a study. */
  const isHeldHere = (): boolean =>
    compare.held?.place?.studyId === null &&
    bench.study.chords.some(({ id }) => id === compare.held?.chord.id);

  async function begin(): Promise<void> {
    if (isHeldHere()) return;
    compare.clear();
    if (route.query[NAMES.held] === undefined) return;
    reading = true;
    try {
      const { held, now, beside, whole } = await readAddress(route.query, sources);
      if (now) taking.bring(now);
      compare.hold(held);
      compare.add(beside);
      if (!whole) notice(GONE);
    } finally {
      reading = false;
    }
  }

  watch(
    () => study.study?.id,
    () => void begin(),
    { immediate: true },
  );
  watch([address, () => route.path], ([query]) => {
    if (reading) return;
    const own: readonly string[] = Object.values(NAMES);
    const others = Object.entries(route.query).filter(([name]) => !own.includes(name));
    void router.replace({ query: { ...Object.fromEntries(others), ...query }, hash: route.hash });
  });
}
