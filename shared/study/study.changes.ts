import type { DraftDocument } from '#shared/study/draft';
import { emptyChord } from '#shared/study/new-study';
import { MAX_CHORDS, type Chord } from '#shared/study/study.document';
import { respell } from '#shared/study/voices.changes';

/** What of a study may be set by itself. */
export type StudySettings = Partial<Omit<DraftDocument, 'schemaVersion' | 'chords'>>;

/** @returns the study with some of its settings changed; notes keep their spelling */
export function setStudy(study: DraftDocument, settings: StudySettings): DraftDocument {
  return { ...study, ...settings };
}

/** @returns the study with one chord changed; the same one where the change leaves the chord as it is */
export function changeChord(
  study: DraftDocument,
  chordId: string,
  change: (chord: Chord) => Chord,
): DraftDocument {
  const chord = study.chords.find(({ id }) => id === chordId);
  const changed = chord && change(chord);
  if (!changed || changed === chord) return study;
  return { ...study, chords: study.chords.map((other) => (other === chord ? changed : other)) };
}

/** @returns the study with a chord put in after another, unless it is full: {@link MAX_CHORDS} */
export function addChordAfter(study: DraftDocument, afterId: string, chord: Chord): DraftDocument {
  if (study.chords.length >= MAX_CHORDS) return study;
  const index = study.chords.findIndex(({ id }) => id === afterId);
  return { ...study, chords: study.chords.toSpliced(index < 0 ? study.chords.length : index + 1, 0, chord) };
}

/** @returns a chord like another under new ids, its links renamed so that the two move apart */
export function copyChord(chord: Chord, newId: () => string): Chord {
  const links = new Map<string, string>();
  const linkOf = (name: string | null): string | null => {
    if (name === null) return null;
    const known = links.get(name) ?? newId();
    links.set(name, known);
    return known;
  };
  const voices = chord.voices.map((voice) => ({ ...voice, id: newId(), link: linkOf(voice.link) }));
  return { ...chord, id: newId(), voices };
}

/** @returns the study without a chord; its last one leaves an empty one behind, under `emptyId` */
export function removeChord(study: DraftDocument, chordId: string, emptyId: string): DraftDocument {
  const rest = study.chords.filter(({ id }) => id !== chordId);
  return { ...study, chords: rest.length > 0 ? rest : [emptyChord(emptyId)] };
}

/** @returns the study with a chord moved to another place in the progression, counted from 0 */
export function reorderChord(study: DraftDocument, chordId: string, place: number): DraftDocument {
  const chord = study.chords.find(({ id }) => id === chordId);
  if (!chord || study.chords[place] === chord) return study;
  const rest = study.chords.filter((other) => other !== chord);
  return { ...study, chords: rest.toSpliced(Math.max(place, 0), 0, chord) };
}

/** @returns the study with every note of every chord spelt by its key */
export function respellStudy(study: DraftDocument): DraftDocument {
  return { ...study, chords: study.chords.map((chord) => respell(chord, study.key)) };
}

/** @returns whether no chord of the study has a note */
export function isEmptyStudy(study: DraftDocument): boolean {
  return study.chords.every(({ voices }) => voices.length === 0);
}
