import type { Letter } from '#shared/pitch/names';
import type { Clef } from '#shared/strings/clefs';
import type { BassKind } from '#shared/strings/sections';
import type { Dynamic } from '#shared/study/study.document';
import { setAccidentals, type InForce } from '#shared/notation/accidentals';
import { isTremolo } from '#shared/notation/playing-words';
import type { SectionLine } from '#shared/notation/section-lines';
import { stepOf, writtenNotes, type WrittenNote } from '#shared/notation/written-notes';

/** A head with the accidental that stands before it. */
export interface StaffNote extends WrittenNote {
  readonly accidental: number | null;
}

/** What stands on one staff at one moment. */
export interface StaffChord {
  /** From the bottom. */
  readonly notes: readonly StaffNote[];
  /** Places in `notes` of the lowest and highest head of each double stop. */
  readonly stops: readonly (readonly [number, number])[];
  readonly tremolo: boolean;
  /** All is written an octave under where it is meant, under an 8va. */
  readonly octaveUp: boolean;
  /** From the highest line; one where all are alike. */
  readonly dynamics: readonly Dynamic[];
}

/** The step of each clef's middle line: B4, C4, A3, D3. */
export const MIDDLE_STEPS: Readonly<Record<Clef, number>> = { treble: 34, alto: 28, tenor: 26, bass: 22 };

/** In the treble clef from D7 up, over the fifth ledger line, an 8va reads more easily; from memory. */
const OCTAVE_SIGN_FROM = stepOf({ letter: 'D', octave: 7 });

export interface StaffRules {
  readonly clef: Clef;
  readonly bass: BassKind;
  readonly signature: ReadonlyMap<Letter, number>;
  readonly inForce: InForce;
  readonly dynamic: Dynamic;
}

function lowered(note: WrittenNote): WrittenNote {
  return { ...note, pitch: { ...note.pitch, octave: note.pitch.octave - 1 } };
}

function stopsOf(lines: readonly SectionLine[], notes: readonly WrittenNote[]): StaffChord['stops'] {
  return lines.flatMap((line) => {
    const places = notes.flatMap(({ voiceId }, index) =>
      line.some(({ id }) => id === voiceId) ? [index] : [],
    );
    const [lowest, highest] = [places[0], places.at(-1)];
    return line.length > 1 && lowest !== undefined && highest !== undefined ? [[lowest, highest]] : [];
  });
}

/**
 * Writes what a section plays at one moment on its staff.
 * @param lines of the section, the highest first
 * @param rules clef, signature, and what earlier accidentals of the bar have set
 * @returns the heads and signs, and what is in force afterwards; null where the section is silent
 * @example staffChord([], rules).chord // null
 */
export function staffChord(
  lines: readonly SectionLine[],
  { clef, bass, signature, inForce, dynamic }: StaffRules,
): { readonly chord: StaffChord | null; readonly inForce: InForce } {
  const heads = lines
    .flat()
    .flatMap((voice) => writtenNotes(voice, bass))
    .sort((a, b) => stepOf(a.pitch) - stepOf(b.pitch) || a.pitch.alteration - b.pitch.alteration);
  const highest = heads.at(-1);
  if (!highest) return { chord: null, inForce };
  const octaveUp = clef === 'treble' && stepOf(highest.pitch) >= OCTAVE_SIGN_FROM;
  const placed = octaveUp ? heads.map(lowered) : heads;
  const set = setAccidentals(
    placed.map(({ pitch }) => pitch),
    signature,
    inForce,
  );
  const notes = placed.map((note, index) => ({ ...note, accidental: set.written[index] ?? null }));
  const dynamics = [...new Set(lines.map((line) => line[0]?.dynamic ?? dynamic))];
  const chord = { notes, stops: stopsOf(lines, placed), tremolo: isTremolo(lines), octaveUp, dynamics };
  return { chord, inForce: set.inForce };
}
