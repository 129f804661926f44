import { computed, watch } from 'vue';
import { useRoute, useRouter, type LocationQueryRaw } from 'vue-router';
import type { Voicing } from '#shared/study/voicing';
import { parsePlace, placeText, type VoicingPlace } from '#shared/study/voicing-place';
import { ApiError } from '@/api/api-error';
import { notice } from '@/composables/notices';
import { openPlace } from '@/composables/voicing-sources';
import { useBenchTaking } from '@/pages/lab/compare/bench-taking';
import { useVoicingSources } from '@/pages/lab/compare/sources';
import { useBenchStore } from '@/stores/bench.store';
import { MOST_BESIDE, useCompareStore } from '@/stores/compare.store';
import { useStudyStore } from '@/stores/study.store';

/** Names in the address: A, B, and what stands side by side, in its order. */
const NAMES = { held: 'a', now: 'b', beside: 'beside' } as const;
const BETWEEN = ',';

const GONE = 'What this link compares is not there any more, or is not shared with you.';

/** Keeps what is compared in the address, and compares what the address names, once its study lies open. */
export function useCompareAddress(): void {
  const route = useRoute();
  const router = useRouter();
  const bench = useBenchStore();
  const study = useStudyStore();
  const compare = useCompareStore();
  const taking = useBenchTaking(bench, compare);
  const sources = useVoicingSources();
  let reading = false;

  /** A chord that has changed since it was held is kept nowhere: no link can name it. */
  function placeOf({ place, chord }: Voicing): VoicingPlace | null {
    if (place?.studyId !== null) return place;
    return bench.study.chords.includes(chord) ? place : null;
  }

  function written(voicing: Voicing | null): string | undefined {
    const place = voicing && placeOf(voicing);
    return place ? placeText(place) : undefined;
  }

  const address = computed<LocationQueryRaw>(() => {
    const a = written(compare.held);
    if (a === undefined) return {};
    const b = written(compare.now);
    const beside = compare.beside.flatMap((voicing) => written(voicing) ?? []);
    // As long as nothing has changed there is nothing to compare.
    if (a === b && beside.length === 0) return {};
    return {
      [NAMES.held]: a,
      [NAMES.now]: b,
      [NAMES.beside]: beside.length > 0 ? beside.join(BETWEEN) : undefined,
    };
  });

  async function found(text: unknown): Promise<Voicing | null> {
    const place = typeof text === 'string' ? parsePlace(text) : null;
    if (!place) return null;
    return openPlace(sources, place).catch((error: unknown) => {
      if (!(error instanceof ApiError)) throw error;
      return null;
    });
  }

  /** @returns whether all that the address names was found */
  async function read({ a, b, beside }: Readonly<Record<string, unknown>>): Promise<boolean> {
    const names = typeof beside === 'string' ? beside.split(BETWEEN).slice(0, MOST_BESIDE) : [];
    const [held, now, ...others] = await Promise.all([a, b, ...names].map(found));
    if (now) taking.bring(now);
    compare.hold(held ?? null);
    compare.add(others.filter((other) => other !== null));
    return Boolean(held && (now || b === undefined)) && others.every((other) => other !== null);
  }

  /** A voicing that was held here goes on being held, also when a draft becomes a study. */
  const isHeldHere = (): boolean =>
    compare.held?.place?.studyId === null &&
    bench.study.chords.some(({ id }) => id === compare.held?.chord.id);

  async function begin(): Promise<void> {
    const { query } = route;
    if (isHeldHere()) return;
    compare.clear();
    if (query[NAMES.held] === undefined) return;
    reading = true;
    const whole = await read(query).finally(() => (reading = false));
    if (!whole) notice(GONE);
  }

  // Whatever lies open: its study, or the draft of this browser.
  const opened = computed(() => (study.status === 'loading' ? null : (study.study?.id ?? 'draft')));
  watch(
    opened,
    (id) => {
      if (id !== null && study.status !== 'error') void begin();
    },
    { immediate: true },
  );
  watch([address, () => route.path], ([query]) => {
    if (reading) return;
    const others = Object.entries(route.query).filter(
      ([name]) => !Object.values<string>(NAMES).includes(name),
    );
    void router.replace({ query: { ...Object.fromEntries(others), ...query }, hash: route.hash });
  });
}
