import { naturalHarmonics, type NaturalHarmonic } from '#shared/strings/harmonics';
import { openStringsOf } from '#shared/strings/ranges';
import type { BassKind, Section } from '#shared/strings/sections';
import type { Hertz, Midi } from '#shared/units';

/** A natural harmonic that sounds a tone of the chord. */
export interface OpenStringOffer extends NaturalHarmonic {
  readonly section: Section;
  /** The key that names it. */
  readonly midi: Midi;
  /** Whether the chord has that very pitch, not only its note in another octave. */
  readonly inChord: boolean;
}

const OCTAVE = 12;
/** Partial 8 of a string lies three octaves above it. */
const HIGHEST_ABOVE = 36;

/**
 * What the open strings of a section offer for a chord: every natural harmonic whose key is one of the chord's notes.
 * @param notes of the chord
 * @param section whose strings
 * @param bassKind the kind of double bass
 * @param a4Hz to which the strings are tuned, in equal temperament
 * @returns by pitch, the highest first, and the lowest partial of each first
 * @source partials 2 to 8 of each string; shared/strings/harmonics
 * @example openStringOffers([A4], 'cello', 'four-string', 440)[0]?.partial // 8, of the A string
 */
export function openStringOffers(
  notes: readonly Midi[],
  section: Section,
  bassKind: BassKind,
  a4Hz: Hertz,
): readonly OpenStringOffer[] {
  const classes = new Set(notes.map((midi) => midi % OCTAVE));
  const strings = openStringsOf(section, bassKind);
  const [low, high] = [Math.min(...strings), Math.max(...strings) + HIGHEST_ABOVE];
  const keys = Array.from({ length: high - low + 1 }, (_, index) => high - index);
  return keys
    .filter((midi) => classes.has(midi % OCTAVE))
    .flatMap((midi) =>
      naturalHarmonics(midi, section, bassKind, a4Hz).map((harmonic) => ({
        ...harmonic,
        ...{ section, midi, inChord: notes.includes(midi) },
      })),
    );
}
