import { z } from 'zod';

/** Every failure of the API has this one body. */
export const errorBodySchema = z.object({
  error: z.object({
    /** Stable, for programs: `study.stale`. */
    code: z.string(),
    /** A sentence for people. */
    message: z.string(),
    details: z.unknown().optional(),
  }),
});
export type ErrorBody = z.infer<typeof errorBodySchema>;

/** The details of `input.invalid`: every fault, not only the first. */
export const inputFaultsSchema = z.array(
  z.object({
    /** Dotted, from the root of what was sent: `body.document.chords.1.voices`. */
    path: z.string(),
    message: z.string(),
  }),
);
export type InputFaults = z.infer<typeof inputFaultsSchema>;
