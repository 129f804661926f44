import {
  chordSchema,
  DEFAULT_ENSEMBLE,
  STUDY_SCHEMA_VERSION,
  voiceSchema,
  type Chord,
  type Voice,
} from '#shared/study/study.document';
import type { DraftDocument } from '#shared/study/draft';
import type { Section } from '#shared/strings/sections';

/** Slow enough to hear each chord; common practice. */
const DEFAULT_TEMPO_BPM = 60;
/** ISO 16:1975. */
const DEFAULT_A4_HZ = 440;

/**
 * @param id short and random, see the document's schema
 * @param section the section that plays
 * @param pitch sounding, in scientific notation
 * @returns a voice with nothing set but these
 * @throws ZodError where the id or the pitch cannot stand in a document
 * @example newVoice('voice-1', 'cello', 'A2').locked // false
 */
export function newVoice(id: string, section: Section, pitch: string): Voice {
  return voiceSchema.parse({ id, section, pitch });
}

/** @returns a chord of four beats without notes */
export function emptyChord(id: string): Chord {
  return chordSchema.parse({ id, voices: [] });
}

/**
 * @param chordId the id of its one chord, which is still empty
 * @returns what the bench begins with: C major, 4/4, A4 = 440 Hz, equal temperament, an orchestra's sections
 * @example newStudy('chord-1').chords.length // 1
 */
export function newStudy(chordId: string): DraftDocument {
  return {
    schemaVersion: STUDY_SCHEMA_VERSION,
    title: 'Untitled study',
    about: '',
    key: { tonic: 'C', mode: 'major' },
    metre: { beats: 4, unit: 4 },
    tempoBpm: DEFAULT_TEMPO_BPM,
    a4Hz: DEFAULT_A4_HZ,
    intonation: 'equal',
    ensemble: DEFAULT_ENSEMBLE,
    limits: null,
    chords: [emptyChord(chordId)],
  };
}
