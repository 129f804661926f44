import type { SystemPlan } from '#shared/notation/system-plan';

/** A clef with the room round it, and one sign of a key signature. */
const CLEF = 40;
const SIGN = 10;

/** @returns the room that clef and signature take before the notes, in tenths of a staff space */
export function beginningWidth({ staves }: SystemPlan): number {
  return CLEF + Math.max(...staves.map(({ signature }) => Math.abs(signature))) * SIGN;
}
