import type { z } from 'zod';
import type { InputFaults } from '#shared/contracts/errors';

/** A body of a hundred thousand faults must not make an answer as long. */
const MOST_FAULTS = 100;

/** @returns every fault with its path from the root of what was sent: `body.document.chords.1.voices`. */
export function inputFaults(error: z.ZodError, root: string): InputFaults {
  const faults = error.issues.map((issue) => ({
    path: [root, ...issue.path.map(String)].join('.'),
    message: issue.message,
  }));
  if (faults.length <= MOST_FAULTS) return faults;
  const more = faults.length - MOST_FAULTS;
  return [...faults.slice(0, MOST_FAULTS), { path: root, message: `and ${more} more faults` }];
}
