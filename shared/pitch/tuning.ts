import { fifthsOf, octavesBeyondFifths, ratioOf } from '#shared/pitch/intervals';
import type { Pitch } from '#shared/pitch/names';
import { midiOf, parsePitch } from '#shared/pitch/names';
import type { Intonation } from '#shared/study/study.document';
import type { Hertz, Midi, Semitones } from '#shared/units';

const A4: Midi = 69;
const SEMITONES_PER_OCTAVE: Semitones = 12;
const PURE_FIFTH = 3 / 2;

/**
 * Pure ratios of the twelve notes above the bass, by semitones.
 * @source just intonation: 16/15 9/8 6/5 5/4 4/3 45/32 3/2 8/5 5/3 9/5 15/8
 */
const PURE_RATIOS = [
  1,
  16 / 15,
  9 / 8,
  6 / 5,
  5 / 4,
  4 / 3,
  45 / 32,
  3 / 2,
  8 / 5,
  5 / 3,
  9 / 5,
  15 / 8,
] as const;

/** What a pitch's frequency depends on besides its name. */
export interface Tuning {
  readonly a4Hz: Hertz;
  readonly intonation: Intonation;
  /** The key's tonic, such as `Bb`: where the Pythagorean chain of fifths starts. */
  readonly tonic: string;
  /** The lowest sounding pitch of the chord, to which pure intonation tunes; null for none. */
  readonly bass: Midi | null;
}

/**
 * The frequency of a key in equal temperament.
 * @param midi may lie between the keys
 * @source f = a4 · 2^((midi − 69) / 12), ISO 16:1975 for A4
 * @example equalTempered(60, 440) // 261.6256
 */
export function equalTempered(midi: Midi, a4Hz: Hertz): Hertz {
  return a4Hz * ratioOf(midi - A4);
}

/** @returns the MIDI number, with its fraction, of a frequency in equal temperament */
export function midiOfFrequency(frequencyHz: Hertz, a4Hz: Hertz): Midi {
  return A4 + SEMITONES_PER_OCTAVE * Math.log2(frequencyHz / a4Hz);
}

/**
 * The frequency of a spelt pitch in the study's intonation: equal temperament; pure to the sounding bass,
 * itself tempered; or Pythagorean, a chain of pure fifths from the tonic, itself tempered.
 * @returns hertz
 * @throws RangeError where the tonic is not a note
 * @example frequencyOf(E5 as pitch, { a4Hz: 440, intonation: 'pure', tonic: 'C', bass: 69 }) // 660
 */
export function frequencyOf(pitch: Pitch, tuning: Tuning): Hertz {
  const tempered = equalTempered(midiOf(pitch), tuning.a4Hz);
  if (tuning.intonation === 'pure') return tuning.bass === null ? tempered : pure(midiOf(pitch), tuning);
  return tuning.intonation === 'pythagorean' ? pythagorean(pitch, tuning) : tempered;
}

function pure(midi: Midi, { bass, a4Hz }: Tuning): Hertz {
  const root = bass ?? midi;
  const octaves = Math.floor((midi - root) / SEMITONES_PER_OCTAVE);
  const ratio = PURE_RATIOS[midi - root - SEMITONES_PER_OCTAVE * octaves] ?? 1;
  return equalTempered(root, a4Hz) * ratio * 2 ** octaves;
}

function pythagorean(pitch: Pitch, { tonic, a4Hz }: Tuning): Hertz {
  const origin = parsePitch(`${tonic}4`);
  if (!origin) throw new RangeError(`not a note: ${tonic}`);
  const fifths = fifthsOf(pitch) - fifthsOf(origin);
  const octaves = octavesBeyondFifths(pitch) - octavesBeyondFifths(origin);
  return equalTempered(midiOf(origin), a4Hz) * PURE_FIFTH ** fifths * 2 ** octaves;
}
