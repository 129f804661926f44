import type { BassKind } from '#shared/strings/sections';
import { ensembleSchema, studyDocumentSchema, type Intonation } from '#shared/study/study.document';
import { boundsOf } from '@/components/forms/field-values';

/** The tonics that keys are written in; common practice. */
export const TONICS = ['C', 'Db', 'D', 'Eb', 'E', 'F', 'F#', 'Gb', 'G', 'Ab', 'A', 'Bb', 'B'] as const;

export const BASS_LABELS: Readonly<Record<BassKind, string>> = {
  'four-string': 'four strings',
  extension: 'low extension to C1',
  'five-string': 'five strings',
};

export const INTONATION_LABELS: Readonly<Record<Intonation, string>> = {
  equal: 'equal temperament',
  pure: 'pure to the bass',
  pythagorean: 'Pythagorean',
};

/** What the document itself accepts. */
export const TEMPO_BOUNDS = boundsOf(studyDocumentSchema.shape.tempoBpm);
export const A4_BOUNDS = boundsOf(studyDocumentSchema.shape.a4Hz);
export const PLAYERS_BOUNDS = boundsOf(ensembleSchema.shape.players.shape.violin1);
