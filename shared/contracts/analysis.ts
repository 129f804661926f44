import { z } from 'zod';
import { defineEndpoint, type BodyOf, type ResponseOf } from '#shared/contracts/endpoint';
import { SECTIONS } from '#shared/strings/sections';
import {
  DEFAULT_ENSEMBLE,
  ensembleSchema,
  INTONATIONS,
  MAX_VOICES,
  studyDocumentSchema,
  voiceSchema,
} from '#shared/study/study.document';
import type { MoveKind } from '#shared/voicing/moves/moves';
import { REGISTERS } from '#shared/voicing/registers';

const CONCERT_A_HZ = 440;
/** The pairs told of one register, largest share first: those after them matter little, and 40 voices have 780. */
export const MOST_PAIRS_TOLD = 40;

const MOVE_KINDS = [
  'octaveUp',
  'octaveDown',
  'chordTone',
  'section',
  'leaveOut',
] as const satisfies readonly MoveKind[];

const about = <S extends z.ZodType>(schema: S, description: string): S => schema.meta({ description });

const shape = voiceSchema.shape;

/** One voice of a chord; what may be left out is as in the studies. */
export const analysedVoiceSchema = z.strictObject({
  section: about(shape.section, 'who plays it'),
  pitch: about(
    shape.pitch,
    'sounding pitch in scientific notation: C4 is middle C; accidentals b, bb, #, ##',
  ),
  players: about(shape.players, 'players on this voice; left out, the section’s players are shared evenly'),
  stop: about(shape.stop, 'voices of one section with the same number are one double stop'),
  technique: about(shape.technique, 'how it is played; what is left out is ordinary'),
  dynamic: about(shape.dynamic, 'left out: mf'),
});

const voicePlace = z.number().int().meta({ description: 'the voice’s place in the request, 0 the first' });
const levelDb = z.number().nullable();

const densityFigure = { partials: z.number().int(), levelDb };

const meetingSchema = z.object({
  lowerN: z.number().int(),
  upperN: z.number().int(),
  differenceHz: z.number(),
  share: z.number(),
});

const pairSchema = z.object({
  lower: z.string(),
  upper: z.string(),
  lowerVoice: voicePlace,
  upperVoice: voicePlace,
  share: about(z.number(), 'its part of the register’s clouding, 0 to 1'),
  meetings: about(z.array(meetingSchema), 'the pairs of partials that weigh most, by their numbers'),
});

const moveSchema = z.object({
  kind: z.enum(MOVE_KINDS),
  voices: z.array(voicePlace),
  pitches: about(z.array(z.string()), 'where each of them goes; empty where they are left out'),
  section: z.enum(SECTIONS),
  before: z.number(),
  after: z.number(),
});

const rootSchema = z.object({
  root: about(z.number().int(), 'pitch class, 0 is C'),
  rootSupport: z.number(),
  bassSupport: z.number(),
  ambiguity: z.number(),
});

/** Everything that the program says of one chord. */
export const analysisSchema = z.object({
  muddiness: about(
    z.object({
      index: about(z.number(), 'of the cloudiest register, 0 to 100; 50 stands at the published limits'),
      uncertainty: about(z.number(), 'half the width of the band in which the index may lie, points'),
      registers: z.array(z.object({ name: z.enum(REGISTERS), index: z.number() })),
    }),
    'how much the chord clouds, by register, low to high',
  ),
  roughness: about(
    z.object({ hutchinsonKnopoff: z.number(), sethares: z.number(), vassilakis: z.number() }),
    'published models over all partials, those within a millionth of a semitone joined; the loudest has amplitude 1',
  ),
  limits: about(
    z.array(
      z.object({
        lower: z.string(),
        upper: z.string(),
        interval: z.string(),
        limit: z.string(),
        semitonesBelow: z.number(),
      }),
    ),
    'the pairs under their low interval limit, the furthest under first',
  ),
  density: about(
    z.object({
      bands: about(
        z.array(z.object({ band: z.number().int(), ...densityFigure })),
        'by whole equivalent rectangular bandwidths',
      ),
      registers: z.array(z.object({ name: z.enum(REGISTERS), ...densityFigure })),
    }),
    'audible partials and their energy together, dB against one violinist’s loudest partial at mf',
  ),
  balance: about(
    z.object({
      voices: z.array(
        z.object({
          voice: voicePlace,
          players: z.number().int(),
          heard: about(z.number(), 'the share of its energy that is heard, 0 to 1'),
          covered: about(z.boolean(), 'less than half of it is heard'),
        }),
      ),
      tones: z.array(
        z.object({
          tone: z.string(),
          voices: z.array(voicePlace),
          players: z.number().int(),
          levelDb: about(levelDb, 'against the mean of the other tones; null for the only one'),
          standing: z.enum(['thin', 'even', 'swollen']),
        }),
      ),
    }),
    'who is covered, and which tone of the chord is thin or swollen',
  ),
  character: about(
    z.object({
      weight: about(z.number().nullable(), 'mean pitch by energy, MIDI number'),
      spread: about(z.number(), 'lowest to highest note, semitones'),
      openness: about(
        z.number().nullable(),
        'mean interval between neighbours, the lower ones weighing more',
      ),
      brightnessHz: about(z.number().nullable(), 'centroid of the spectrum'),
      fundamental: about(
        z.object({ frequencyHz: z.number(), multiples: z.array(z.number()) }).nullable(),
        'of which all notes are simple multiples',
      ),
      root: about(rootSchema.nullable(), 'root support and ambiguity after Parncutt 1988'),
    }),
    'what the chord is like as a whole',
  ),
  explanation: about(
    z.object({
      registers: about(
        z.array(z.object({ name: z.enum(REGISTERS), pairs: z.array(pairSchema).max(MOST_PAIRS_TOLD) })),
        `the pairs of notes behind each register that clouds, at most ${MOST_PAIRS_TOLD}, largest share first`,
      ),
      moves: about(z.array(moveSchema), 'single moves that clear the chord by more than the uncertainty'),
    }),
    'where the figures come from and what would change them',
  ),
  partials: about(
    z.array(
      z.object({ voice: voicePlace, n: z.number().int(), frequencyHz: z.number(), levelDb: z.number() }),
    ),
    'of every voice; 0 dB is one violinist’s loudest partial at mf, before the body',
  ),
});

/** Judges a chord; nothing is kept. */
export const createAnalysis = defineEndpoint({
  method: 'POST',
  path: '/api/analysis',
  body: z.strictObject({
    a4Hz: about(studyDocumentSchema.shape.a4Hz.default(CONCERT_A_HZ), 'concert pitch, hertz'),
    intonation: about(
      z.enum(INTONATIONS).default('equal'),
      'equal temperament; pure to the bass; Pythagorean, by fifths from C',
    ),
    ensemble: about(
      ensembleSchema.default(DEFAULT_ENSEMBLE),
      'players of each section and the kind of double bass',
    ),
    voices: about(
      z
        .array(analysedVoiceSchema)
        .min(1, 'a chord needs at least one voice')
        .max(MAX_VOICES, `a chord has at most ${MAX_VOICES} voices`),
      `1 to ${MAX_VOICES} voices, in any order`,
    ),
  }),
  response: analysisSchema,
});
export type AnalysisRequest = BodyOf<typeof createAnalysis>;
export type Analysis = ResponseOf<typeof createAnalysis>;
