import type { ChordAnalysis } from '#shared/voicing/analysis';
import { CLEAR_BELOW } from '#shared/voicing/sentences';
import type { Midi } from '#shared/units';

/**
 * Where a chord clouds most, on the pitch axis.
 * @returns null where it is clear
 */
export function cloudsAt({ index, register, registers }: ChordAnalysis['muddiness']): Midi | null {
  if (index < CLEAR_BELOW) return null;
  return registers.find((other) => other.register === register)?.at ?? null;
}
