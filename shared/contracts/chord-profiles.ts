import { z } from 'zod';
import { REGISTERS } from '#shared/voicing/registers';

/** How much a chord clouds, by register: what a small profile is drawn from. */
export const chordProfileSchema = z.object({
  name: z.string().nullable(),
  /** Of the cloudiest register, 0 to 100. */
  index: z.number(),
  register: z.enum(REGISTERS).nullable(),
  registers: z.array(z.object({ register: z.enum(REGISTERS), index: z.number() })),
});
export type ChordProfile = z.infer<typeof chordProfileSchema>;
