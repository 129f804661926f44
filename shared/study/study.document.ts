import { z } from 'zod';
import { PITCH_PATTERN } from '#shared/pitch/names';
import { BASS_KINDS, SECTIONS } from '#shared/strings/sections';
import { ownLimitsSchema } from '#shared/study/own-limits';
import { REGISTERS } from '#shared/voicing/registers';

/** Raised whenever a stored document needs an upgrade to be read. */
export const STUDY_SCHEMA_VERSION = 1;

export const MAX_CHORDS = 200;
export const MAX_VOICES = 40;
export const MAX_TITLE = 120;
export const MAX_CHORD_NAME = 40;

export const CONTACTS = ['ordinary', 'sulTasto', 'sulPonticello'] as const;
export const STROKES = ['sustained', 'tremolo', 'pizzicato'] as const;
export const HARMONICS = ['none', 'natural', 'artificial'] as const;
export const DYNAMICS = ['ppp', 'pp', 'p', 'mp', 'mf', 'f', 'ff', 'fff'] as const;
export const INTONATIONS = ['equal', 'pure', 'pythagorean'] as const;
export const MODES = [
  'major',
  'minor',
  'dorian',
  'phrygian',
  'lydian',
  'mixolydian',
  'aeolian',
  'locrian',
] as const;

export type Dynamic = (typeof DYNAMICS)[number];
export type Intonation = (typeof INTONATIONS)[number];
export type Mode = (typeof MODES)[number];

/** Short random identifiers of chords and voices; they tie annotations to what they are about. */
const idSchema = z.string().regex(/^[A-Za-z0-9_-]{6,36}$/, 'an id has 6 to 36 letters, digits, - or _');

const pitchSchema = z
  .string()
  .regex(PITCH_PATTERN, {
    error: 'a pitch is a letter A to G, an accidental and an octave 0 to 8, such as Bb2',
    // What is no pitch at all is told once.
    abort: true,
  })
  .refine((name) => /[0-8]$/.test(name) && !name.includes('-'), 'octaves run from 0 to 8');

/** A note without its octave. */
const TONIC_PATTERN = /^[A-G](b|#)?$/;

/** Annotations hang on these ids, so that one names one thing. */
function namedOnce(things: readonly { readonly id: string }[]): boolean {
  return new Set(things.map(({ id }) => id)).size === things.length;
}

export const techniqueSchema = z.strictObject({
  contact: z.enum(CONTACTS).default('ordinary'),
  mute: z.boolean().default(false),
  stroke: z.enum(STROKES).default('sustained'),
  harmonic: z.enum(HARMONICS).default('none'),
});
export type Technique = z.infer<typeof techniqueSchema>;

export const voiceSchema = z.strictObject({
  id: idSchema,
  section: z.enum(SECTIONS),
  /** Sounding pitch, spelt, in scientific notation. */
  pitch: pitchSchema,
  /** Players on this voice; null shares the section's players evenly. */
  players: z.number().int().min(1).max(60).nullable().default(null),
  /** Voices of one section with the same number are one double stop. */
  stop: z.number().int().min(1).max(20).nullable().default(null),
  technique: techniqueSchema.default(techniqueSchema.parse({})),
  /** Its own dynamic; null takes the chord's. */
  dynamic: z.enum(DYNAMICS).nullable().default(null),
  /** The string to play on, 1 the highest; null leaves it to the player. */
  string: z.number().int().min(1).max(5).nullable().default(null),
  /** A locked voice is the melody: suggestions leave it where it is. */
  locked: z.boolean().default(false),
  /** Voices with the same link move together. */
  link: idSchema.nullable().default(null),
});
export type Voice = z.infer<typeof voiceSchema>;

export const chordSchema = z.strictObject({
  id: idSchema,
  name: z.string().trim().max(MAX_CHORD_NAME).nullable().default(null),
  beats: z.number().min(0.25).max(64).default(4),
  dynamic: z.enum(DYNAMICS).default('mf'),
  voices: z
    .array(voiceSchema)
    .max(MAX_VOICES, `a chord has at most ${MAX_VOICES} voices`)
    .refine(namedOnce, 'two voices of a chord have the same id'),
  /** What clouds on purpose: the whole chord, or some registers. */
  onPurpose: z
    .strictObject({ chord: z.boolean(), registers: z.array(z.enum(REGISTERS)).max(REGISTERS.length) })
    .default({ chord: false, registers: [] }),
  /** The root, as a note without its octave, where the bass is played elsewhere: `Bb`. */
  rootElsewhere: z
    .string()
    .regex(TONIC_PATTERN, 'a root is a letter A to G and an accidental')
    .nullable()
    .default(null),
});
export type Chord = z.infer<typeof chordSchema>;

/** A chord that can be kept: the draft's may still be empty. */
const savedChordSchema = chordSchema.extend({
  voices: chordSchema.shape.voices.min(1, 'this chord has no notes yet: give it one, or take the chord away'),
});

const playersSchema = z.number().int().min(1, 'a section has at least one player').max(60);

export const ensembleSchema = z.strictObject({
  players: z.strictObject({
    violin1: playersSchema,
    violin2: playersSchema,
    viola: playersSchema,
    cello: playersSchema,
    doubleBass: playersSchema,
  }),
  bass: z.enum(BASS_KINDS),
});
export type Ensemble = z.infer<typeof ensembleSchema>;

export const studyDocumentSchema = z.strictObject({
  schemaVersion: z.literal(STUDY_SCHEMA_VERSION),
  title: z.string().trim().min(1, 'a study needs a title').max(MAX_TITLE),
  about: z.string().max(2000).default(''),
  key: z.strictObject({ tonic: z.string().regex(TONIC_PATTERN), mode: z.enum(MODES) }),
  metre: z.strictObject({
    beats: z.number().int().min(1).max(32),
    unit: z.union([z.literal(1), z.literal(2), z.literal(4), z.literal(8), z.literal(16)]),
  }),
  tempoBpm: z.number().min(20).max(300),
  a4Hz: z.number().min(415).max(466),
  intonation: z.enum(INTONATIONS),
  ensemble: ensembleSchema,
  /** The low interval limits in force. */
  limits: ownLimitsSchema,
  chords: z
    .array(savedChordSchema)
    .min(1, 'a study has at least one chord')
    .max(MAX_CHORDS)
    .refine(namedOnce, 'two chords of a study have the same id'),
});
export type StudyDocument = z.infer<typeof studyDocumentSchema>;

/** What the bench works on: a study in which a chord may still be empty. */
export const draftDocumentSchema = studyDocumentSchema.extend({
  chords: z.array(chordSchema).min(1).max(MAX_CHORDS),
});

/** 14.12.10.8.6, "concert standard" of Tim Davies, deBreved: String Section Sizes. */
export const DEFAULT_ENSEMBLE: Ensemble = {
  players: { violin1: 14, violin2: 12, viola: 10, cello: 8, doubleBass: 6 },
  bass: 'four-string',
};
