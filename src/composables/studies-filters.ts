import { computed } from 'vue';
import { useRoute, useRouter, type LocationQuery } from 'vue-router';
import type { QueryInputOf } from '#shared/contracts/endpoint';
import { listStudies } from '#shared/contracts/studies';

/** What of the list is asked for; the address holds it, so that it can be kept and passed on. */
export type StudiesFilters = Omit<QueryInputOf<typeof listStudies>, 'after' | 'limit'>;

const filtersSchema = listStudies.query.omit({ after: true, limit: true }).partial();
const FIELDS = filtersSchema.keyof().options;

/** What cannot be read in an address is left out: it names nothing. */
function readFilters(query: LocationQuery): StudiesFilters {
  const read = FIELDS.flatMap((name) => {
    const parsed = filtersSchema.shape[name].safeParse(query[name] ?? undefined);
    return parsed.success && query[name] !== undefined ? [[name, parsed.data] as const] : [];
  });
  const parsed = filtersSchema.safeParse(Object.fromEntries(read));
  return parsed.success ? parsed.data : {};
}

/** The filters and the order of the list, as the address has them. */
export function useStudiesFilters() {
  const [route, router] = [useRoute(), useRouter()];
  const filters = computed(() => readFilters(route.query));
  const isFiltered = computed(() =>
    Object.keys(filters.value).some((name) => name !== 'sort' && name !== 'order'),
  );

  function set(changed: Partial<StudiesFilters>): void {
    const all = Object.entries({ ...filters.value, ...changed });
    const query = all.flatMap(([name, value]) =>
      value === undefined || value === '' ? [] : [[name, String(value)]],
    );
    void router.replace({ query: Object.fromEntries(query) });
  }

  const { sort, order } = {
    sort: computed(() => filters.value.sort),
    order: computed(() => filters.value.order),
  };
  return { filters, isFiltered, sort, order, set, clear: () => void router.replace({ query: {} }) };
}
