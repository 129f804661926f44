import type { LocationQuery } from 'vue-router';
import type { Voicing } from '#shared/study/voicing';
import { parsePlace } from '#shared/study/voicing-place';
import { ApiError } from '@/api/api-error';
import { openPlace, type VoicingSource } from '@/composables/voicing-sources';
import { MOST_BESIDE } from '@/stores/compare.store';

/** Names in the address: A, B, and what stands side by side, in its order. */
export const NAMES = { held: 'a', now: 'b', beside: 'beside' } as const;
export const BETWEEN = ',';

/** What an address names. */
export interface AddressedVoicings {
  readonly held: Voicing | null;
  readonly now: Voicing | null;
  readonly beside: readonly Voicing[];
  /** Whether all that it names was found. */
  readonly whole: boolean;
}

async function find(sources: readonly VoicingSource[], text: unknown): Promise<Voicing | null> {
  const place = typeof text === 'string' ? parsePlace(text) : null;
  if (!place) return null;
  return openPlace(sources, place).catch((error: unknown) => {
    if (!(error instanceof ApiError)) throw error;
    return null;
  });
}

/** Opens what an address names, as far as this reader may see it. */
export async function readAddress(
  query: LocationQuery,
  sources: readonly VoicingSource[],
): Promise<AddressedVoicings> {
  const { [NAMES.held]: a, [NAMES.now]: b, [NAMES.beside]: rest } = query;
  const names = typeof rest === 'string' ? rest.split(BETWEEN).slice(0, MOST_BESIDE) : [];
  const [held = null, now = null, ...others] = await Promise.all(
    [a, b, ...names].map((name) => find(sources, name)),
  );
  const beside = others.filter((other) => other !== null);
  const whole = held !== null && (now !== null || b === undefined) && beside.length === names.length;
  return { held, now, beside, whole };
}
