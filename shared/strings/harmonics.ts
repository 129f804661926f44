import { centsOf } from '#shared/pitch/intervals';
import { midiOfName } from '#shared/pitch/names';
import { equalTempered, midiOfFrequency } from '#shared/pitch/tuning';
import type { GradedFinding } from '#shared/strings/grades';
import { openStringsOf } from '#shared/strings/ranges';
import type { BassKind, Section } from '#shared/strings/sections';
import type { Voice } from '#shared/study/study.document';
import type { Hertz, Midi, Semitones } from '#shared/units';

/** Natural harmonics are written up to the eighth partial of a string. */
const HIGHEST_NATURAL_PARTIAL = 8;
const FIRST_NATURAL_PARTIAL = 2;
/** The seventh partial lies 31 cents under the key that names it. */
const SAME_KEY_SEMITONES = 0.5;
const CENTS_PER_SEMITONE = 100;
/** Up to the fourth partial a natural harmonic speaks at once; from memory. */
const EASY_NATURAL_PARTIAL = 4;
/** An artificial harmonic touched a fourth above the stopped note sounds its fourth partial. */
const TOUCH_FOURTH: Semitones = 5;
const TWO_OCTAVES: Semitones = 24;
/** On the cello the touched fourth is in reach from about the fourth position up; from memory. */
const CELLO_FOURTH_POSITION: Semitones = 7;

/** One way to play a natural harmonic. */
export interface NaturalHarmonic {
  /** 1 is the highest string. */
  readonly string: number;
  readonly open: Midi;
  readonly partial: number;
  /** Where to touch, semitones above the open string, lowest first. */
  readonly touch: readonly Semitones[];
  readonly frequencyHz: Hertz;
  /** Off the key that names it. */
  readonly centsOff: number;
}

/** Where an artificial harmonic is stopped and touched. */
export interface ArtificialHarmonic {
  readonly stopped: Midi;
  readonly touched: Midi;
}

/**
 * Where a string must be touched for a partial to sound alone: at its nodes that are no node of a lower one.
 * @returns semitones above the open string, lowest first
 * @source nodes at k/n of the string, k and n without common factor; −12 log2(1 − k/n)
 * @example nodesOf(3) // [7.02, 19.02]
 */
export function nodesOf(partial: number): readonly Semitones[] {
  return Array.from({ length: partial - 1 }, (_, i) => i + 1)
    .filter((k) => greatestCommonDivisor(k, partial) === 1)
    .map((k) => centsOf(1 / (1 - k / partial)) / CENTS_PER_SEMITONE);
}

/**
 * Every way to play a pitch as a natural harmonic, the lowest partial first.
 * @param midi the sounding pitch
 * @param string the string to play on, 1 the highest; null for any
 * @example naturalHarmonics(85, 'cello', 'four-string', 440)[0] // C#6: fifth partial of the A string
 */
export function naturalHarmonics(
  midi: Midi,
  section: Section,
  bassKind: BassKind,
  a4Hz: Hertz,
  string: number | null = null,
): readonly NaturalHarmonic[] {
  const found: NaturalHarmonic[] = [];
  const strings = openStringsOf(section, bassKind);
  for (let partial = FIRST_NATURAL_PARTIAL; partial <= HIGHEST_NATURAL_PARTIAL; partial += 1) {
    strings.forEach((open, index) => {
      if (string !== null && string !== index + 1) return;
      const frequencyHz = partial * equalTempered(open, a4Hz);
      const off = midiOfFrequency(frequencyHz, a4Hz) - midi;
      if (Math.abs(off) >= SAME_KEY_SEMITONES) return;
      const centsOff = off * CENTS_PER_SEMITONE;
      found.push({ string: index + 1, open, partial, touch: nodesOf(partial), frequencyHz, centsOff });
    });
  }
  return found;
}

/**
 * How a pitch is played as an artificial harmonic: stopped two octaves lower, touched a fourth above that.
 * @returns sounding pitches of stop and touch; null where no string has the stop
 * @example artificialHarmonic(88, 'violin1', 'four-string') // E6: stopped at E4, touched at A4
 */
export function artificialHarmonic(
  midi: Midi,
  section: Section,
  bassKind: BassKind,
): ArtificialHarmonic | null {
  const stopped = midi - TWO_OCTAVES;
  const reachable = openStringsOf(section, bassKind).some((open) => open < stopped);
  return reachable ? { stopped, touched: stopped + TOUCH_FOURTH } : null;
}

/**
 * The frequency at which a natural harmonic sounds: a partial of an open string, with that partial's own
 * tuning. An artificial harmonic (touched a fourth above the stopped note) sounds two octaves above that note,
 * in the note's own tuning, so it needs none.
 * @returns hertz; null where the voice is no natural harmonic or none of the strings has the pitch
 * @source partials of a string: whole multiples of its fundamental
 * @example harmonicFrequency(C#6 on the cello's A string, 'four-string', 440) // 1100, five times 220
 */
export function harmonicFrequency(
  voice: Pick<Voice, 'section' | 'pitch' | 'technique' | 'string'>,
  bassKind: BassKind,
  a4Hz: Hertz,
): Hertz | null {
  if (voice.technique.harmonic !== 'natural') return null;
  const [first] = naturalHarmonics(midiOfName(voice.pitch), voice.section, bassKind, a4Hz, voice.string);
  return first?.frequencyHz ?? null;
}

/** @returns how playable a harmonic is; null where the voice is none */
export function harmonicFinding(
  voice: Pick<Voice, 'section' | 'pitch' | 'technique' | 'string'>,
  bassKind: BassKind,
  a4Hz: Hertz,
): GradedFinding | null {
  const midi = midiOfName(voice.pitch);
  const { harmonic } = voice.technique;
  if (harmonic === 'none') return null;
  if (harmonic === 'artificial') return artificialFinding(midi, voice.section, bassKind);
  const [first] = naturalHarmonics(midi, voice.section, bassKind, a4Hz, voice.string);
  if (!first) return { grade: 'not playable', reason: 'no open string has this pitch among its partials' };
  const where = `partial ${first.partial} of string ${first.string}`;
  return first.partial <= EASY_NATURAL_PARTIAL
    ? { grade: 'easy', reason: where }
    : { grade: 'awkward', reason: `${where} speaks late` };
}

function artificialFinding(midi: Midi, section: Section, bassKind: BassKind): GradedFinding {
  const way = artificialHarmonic(midi, section, bassKind);
  if (!way) return { grade: 'not playable', reason: 'no string can be stopped two octaves lower' };
  if (section === 'doubleBass') {
    return { grade: 'not playable', reason: 'the touched fourth is beyond the hand on the double bass' };
  }
  const position =
    way.stopped - Math.max(...openStringsOf(section, bassKind).filter((open) => open < way.stopped));
  if (section === 'cello' && position < CELLO_FOURTH_POSITION) {
    return { grade: 'awkward', reason: 'the touched fourth is a wide stretch this low on the cello' };
  }
  return { grade: 'easy', reason: 'stopped two octaves lower and touched a fourth above' };
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
