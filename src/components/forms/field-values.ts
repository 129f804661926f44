import type { z } from 'zod';

/** @returns the one of the known values that a choice stands at */
export function chosenOf<Value extends string>(known: readonly Value[], event: Event): Value | undefined {
  const { target } = event;
  return known.find((value) => target instanceof HTMLSelectElement && value === target.value);
}

/** @returns the number in a field, not a number where there is none */
export function numberOf(event: Event): number {
  return event.target instanceof HTMLInputElement ? event.target.valueAsNumber : NaN;
}

/** The bounds that a schema sets to a number. */
export interface Bounds {
  readonly min: number;
  readonly max: number;
}

export function boundsOf({ minValue, maxValue }: z.ZodNumber): Bounds {
  return { min: minValue ?? -Infinity, max: maxValue ?? Infinity };
}
