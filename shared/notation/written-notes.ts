import { midiOf, parsePitch, type Letter, type Pitch } from '#shared/pitch/names';
import { artificialHarmonic } from '#shared/strings/harmonics';
import type { BassKind, Section } from '#shared/strings/sections';
import type { Voice } from '#shared/study/study.document';

/** One head on the staff. */
export interface WrittenNote {
  readonly voiceId: string;
  /** As it is written: the double bass an octave over its sound. */
  readonly pitch: Pitch;
  /** A diamond is touched and not stopped. */
  readonly head: 'ordinary' | 'touched';
  /** The small circle of a natural harmonic. */
  readonly circled: boolean;
}

const LETTERS: readonly Letter[] = ['C', 'D', 'E', 'F', 'G', 'A', 'B'];
/** An artificial harmonic of the touched fourth is stopped two octaves under its sound. */
const OCTAVES_UNDER = 2;
const FOURTH = { letters: 3, semitones: 5 } as const;

/**
 * Where a letter stands on the staff: steps of the scale over C0, whatever the accidental.
 * @example stepOf({ letter: 'C', octave: 4 }) // 28
 */
export function stepOf({ letter, octave }: Pick<Pitch, 'letter' | 'octave'>): number {
  return LETTERS.indexOf(letter) + LETTERS.length * octave;
}

function fourthAbove(pitch: Pitch): Pitch {
  const step = stepOf(pitch) + FOURTH.letters;
  const letter = LETTERS[step % LETTERS.length] ?? 'C';
  const octave = Math.floor(step / LETTERS.length);
  const natural = midiOf({ letter, alteration: 0, octave });
  return { letter, octave, alteration: midiOf(pitch) + FOURTH.semitones - natural };
}

function raised(pitch: Pitch, section: Section): Pitch {
  return section === 'doubleBass' ? { ...pitch, octave: pitch.octave + 1 } : pitch;
}

/**
 * The heads that write a voice: one; or for an artificial harmonic the stopped note, and the touched fourth over
 * it as a diamond. A natural harmonic stands where it sounds, with a circle, and so does an artificial one that
 * no string can stop.
 * @param voice its pitch sounding
 * @param bass which double basses play
 * @returns written heads, the lower first
 * @throws RangeError where the voice's pitch is none
 * @source common practice; the double bass written an octave up
 * @example writtenNotes(double bass D2, 'four-string') // D3
 */
export function writtenNotes(
  voice: Pick<Voice, 'id' | 'section' | 'pitch' | 'technique'>,
  bass: BassKind,
): readonly WrittenNote[] {
  const sounding = parsePitch(voice.pitch);
  if (!sounding) throw new RangeError(`not a pitch: ${voice.pitch}`);
  const { section } = voice;
  const { harmonic } = voice.technique;
  const head = (pitch: Pitch, kind: WrittenNote['head'], circled = false): WrittenNote => ({
    voiceId: voice.id,
    pitch: raised(pitch, section),
    head: kind,
    circled,
  });
  const stoppable = harmonic === 'artificial' && artificialHarmonic(midiOf(sounding), section, bass) !== null;
  if (!stoppable) return [head(sounding, 'ordinary', harmonic !== 'none')];
  const stopped = { ...sounding, octave: sounding.octave - OCTAVES_UNDER };
  return [head(stopped, 'ordinary'), head(fourthAbove(stopped), 'touched')];
}
