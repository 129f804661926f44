import { z } from 'zod';
import { defineEndpoint, type BodyOf, type ResponseOf } from '#shared/contracts/endpoint';
import { ROUGHNESS_MODELS } from '#shared/hearing/roughness-models';
import { SECTIONS } from '#shared/strings/sections';
import { DYNAMICS, MAX_VOICES, techniqueSchema, voiceSchema } from '#shared/study/study.document';

/** Where partials lie: as they are, or each on the nearest key. */
export const ROUGHNESS_VARIANTS = ['exact', 'rounded'] as const;
/** As many partials as the program's own voices have. */
export const MAX_HARMONICS = 32;
const HIGHEST_MIDI = 127;

/** A published model of roughness over harmonic tones with amplitudes 1/n. */
export const measureRoughness = defineEndpoint({
  method: 'POST',
  path: '/api/measures/roughness',
  body: z.strictObject({
    model: z.enum(ROUGHNESS_MODELS).meta({ description: 'which published model' }),
    variant: z
      .enum(ROUGHNESS_VARIANTS)
      .default('exact')
      .meta({ description: 'whether partials lie exactly or on the nearest key' }),
    midi: z
      .array(z.number().min(0, 'MIDI numbers begin at 0').max(HIGHEST_MIDI, 'MIDI numbers end at 127'))
      .min(1, 'a chord needs at least one note')
      .max(MAX_VOICES, `a chord has at most ${MAX_VOICES} notes`)
      .meta({ description: 'the notes, 60 is C4; equal temperament on 440 Hz' }),
    harmonics: z.number().int().min(1).max(MAX_HARMONICS).meta({
      description: 'partials of each note; published with 11 where they lie exactly, 10 where rounded',
    }),
  }),
  response: z.object({
    value: z.number().meta({ description: 'in the model’s own unit' }),
    source: z.string().meta({ description: 'where the model was published' }),
  }),
});

const playingShape = {
  section: z.enum(SECTIONS).meta({ description: 'who plays the note' }),
  players: voiceSchema.shape.players.meta({ description: 'left out: the section’s usual number' }),
  technique: techniqueSchema
    .default(techniqueSchema.parse({}))
    .meta({ description: 'what is left out is ordinary' }),
  dynamic: z.enum(DYNAMICS).default('mf').meta({ description: 'left out: mf' }),
};

/** The low interval limits of two sections: the published chart's and the model's, lower notes. */
export const measureLimits = defineEndpoint({
  method: 'POST',
  path: '/api/measures/limits',
  body: z.strictObject({
    ...playingShape,
    upper: z
      .strictObject(playingShape)
      .optional()
      .meta({ description: 'the same for the upper note; left out: as the lower one' }),
  }),
  response: z.object({
    limits: z
      .array(
        z.object({
          interval: z.string(),
          semitones: z.number().int(),
          chart: z.string().nullable().meta({ description: 'null for the octave, which has no limit' }),
          model: z.string().nullable().meta({
            description: 'the lowest placing at an index of 50 or under; null where none is over it',
          }),
        }),
      )
      .meta({ description: 'sixteen intervals, from the minor second to the major tenth' }),
  }),
});
export type RoughnessRequest = BodyOf<typeof measureRoughness>;
export type RoughnessAnswer = ResponseOf<typeof measureRoughness>;
export type LimitsRequest = BodyOf<typeof measureLimits>;
export type LimitsAnswer = ResponseOf<typeof measureLimits>;
