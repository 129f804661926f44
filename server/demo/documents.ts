import { applyTyped } from '#shared/study/typed.changes';
import { emptyChord, newStudy } from '#shared/study/new-study';
import { comfortableReach } from '#shared/study/reach';
import {
  DEFAULT_ENSEMBLE,
  studyDocumentSchema,
  type Chord,
  type StudyDocument,
} from '#shared/study/study.document';
import { parseTypingLine } from '#shared/study/typing-line';
import type { DemoChord, DemoStudy } from '#server/demo/scenario';

const REACH = comfortableReach(DEFAULT_ENSEMBLE.bass);

/** Ids that tell a chord or voice within its study. */
type NewId = () => string;

function counter(): NewId {
  let last = 0;
  return () => `demo-${String((last += 1)).padStart(4, '0')}`;
}

function buildChord(chord: DemoChord, newId: NewId): Chord {
  const { voices, faults } = parseTypingLine(chord.line, 'english', REACH);
  if (faults.length > 0) throw new Error(`the demo's line "${chord.line}" cannot be read`);
  const typed = applyTyped(emptyChord(newId()), voices, newId);
  return {
    ...typed,
    name: chord.name,
    beats: chord.beats,
    dynamic: chord.dynamic ?? typed.dynamic,
    onPurpose: { chord: false, registers: [...(chord.cloudsOnPurpose ?? [])] },
    voices: typed.voices.map((voice) => ({
      ...voice,
      technique: { ...voice.technique, mute: chord.muted ?? false },
    })),
  };
}

/** @returns the document of a study of the scenario, as if it had been typed on the bench. */
export function buildDemoDocument(study: DemoStudy): StudyDocument {
  const newId = counter();
  const { title, about, key, tempoBpm } = study;
  return studyDocumentSchema.parse({
    ...newStudy(newId()),
    title,
    about,
    key,
    tempoBpm,
    chords: study.chords.map((chord) => buildChord(chord, newId)),
  });
}
