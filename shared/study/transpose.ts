import { LETTER_SEMITONES, midiOf, parsePitch, pitchName, type Pitch } from '#shared/pitch/names';
import type { SpellingKey } from '#shared/pitch/spelling';
import type { DraftDocument } from '#shared/study/draft';
import { LETTERS } from '#shared/study/harmony/harmony';
import { scaleOf } from '#shared/study/harmony/scales';
import { isWithin, moveSelected } from '#shared/study/selected.changes';
import { spellIn } from '#shared/pitch/spelling';
import type { Chord } from '#shared/study/study.document';
import type { Semitones } from '#shared/units';

/** Which way a passage goes into another key: where it is nearest, or up or down. */
export const DIRECTIONS = ['nearest', 'up', 'down'] as const;
export type Direction = (typeof DIRECTIONS)[number];

const OCTAVE: Semitones = 12;
const STEPS = LETTERS.length;
/** More than a double accidental has no sign. */
const MAX_ALTERATION = 2;

function tonicOf(key: SpellingKey): Pitch {
  const pitch = parsePitch(`${key.tonic}0`);
  if (!pitch) throw new RangeError(`not a tonic: ${key.tonic}`);
  return pitch;
}

function placeOf({ letter, octave }: Pitch): number {
  return LETTERS.indexOf(letter) + STEPS * octave;
}

/** Semitones by which the tonic moves when it moves by so many letters. */
function riseOf(from: Pitch, to: Pitch, steps: number): Semitones {
  const octave = Math.floor((placeOf(from) + steps) / STEPS);
  return midiOf({ ...to, octave }) - midiOf(from);
}

/** Letters by which everything moves: the tonic to the next tonic above or below. */
function stepsBetween(from: SpellingKey, to: SpellingKey, direction: Direction): number {
  const [old, wanted] = [tonicOf(from), tonicOf(to)];
  const up = (LETTERS.indexOf(wanted.letter) - LETTERS.indexOf(old.letter) + STEPS) % STEPS;
  const ways = [up, up - STEPS, up + STEPS].map((steps) => ({ steps, rise: riseOf(old, wanted, steps) }));
  const right = ways.filter(({ rise }) =>
    direction === 'nearest' ? true : direction === 'up' ? rise >= 0 : rise <= 0,
  );
  const nearest = right.sort((a, b) => Math.abs(a.rise) - Math.abs(b.rise))[0];
  return nearest?.steps ?? up;
}

/** How far a note is altered from its degree of the key. */
function offOf(pitch: Pitch, key: SpellingKey): { readonly steps: number; readonly off: Semitones } {
  const tonic = tonicOf(key);
  const steps = placeOf(pitch) - placeOf(tonic);
  return { steps, off: midiOf(pitch) - midiOf(tonic) - degreeAt(key, steps) };
}

/** Semitones of a degree above the tonic, the tonic being 0, through all octaves. */
function degreeAt(key: SpellingKey, steps: number): Semitones {
  const octaves = Math.floor(steps / STEPS);
  return (scaleOf(key.mode)[steps - STEPS * octaves] ?? 0) + OCTAVE * octaves;
}

/**
 * A note in another key: the same degree, altered as it was, on the letter that the degree has there.
 * @returns the spelt pitch; where that would take three accidentals, spelt as the key spells what sounds so
 * @example intoKey(F#4, C major, F major, 'nearest') // B4: the sharp fourth degree of both
 */
function inKey(pitch: Pitch, from: SpellingKey, to: SpellingKey, shift: number): Pitch {
  const { steps, off } = offOf(pitch, from);
  const tonic = tonicOf(to);
  // The tonic's own place is that of the new key, moved by as many letters as the keys lie apart.
  const base = placeOf(tonicOf(from)) + shift - placeOf(tonic);
  const midi = midiOf(tonic) + degreeAt(to, steps + base) + off;
  const place = placeOf(tonic) + steps + base;
  const octave = Math.floor(place / STEPS);
  const letter = LETTERS[place - STEPS * octave] ?? 'C';
  const alteration = midi - (OCTAVE * (octave + 1) + LETTER_SEMITONES[letter]);
  return Math.abs(alteration) <= MAX_ALTERATION ? { letter, alteration, octave } : spellIn(midi, to);
}

/**
 * Takes chords into another key, degree by degree, so that what was spelt by one key is spelt by the other.
 * Into another mode the degrees of the one become those of the other.
 * @param chords in any number
 * @param from the key they stand in
 * @param to the key they go to
 * @param direction up, down, or whichever way is shorter
 * @returns the chords; the same ones where a note would leave the limits
 * @example chordsIntoKey([C E G], C major, Eb major, 'up') // Eb G Bb
 */
export function chordsIntoKey(
  chords: readonly Chord[],
  from: SpellingKey,
  to: SpellingKey,
  direction: Direction,
): readonly Chord[] {
  const shift = stepsBetween(from, to, direction);
  let within = true;
  const moved = chords.map((chord) => ({
    ...chord,
    voices: chord.voices.map((voice) => {
      const pitch = parsePitch(voice.pitch);
      if (!pitch) return voice;
      const there = inKey(pitch, from, to, shift);
      within &&= isWithin(midiOf(there)) && there.octave >= 0;
      return { ...voice, pitch: pitchName(there) };
    }),
  }));
  return within ? moved : chords;
}

/** @returns the study in another key, all of its chords with it; the same one where a note would leave the limits */
export function studyIntoKey(study: DraftDocument, to: SpellingKey, direction: Direction): DraftDocument {
  const chords = chordsIntoKey(study.chords, study.key, to, direction);
  return chords === study.chords ? study : { ...study, key: { ...to }, chords: [...chords] };
}

/** @returns the study with every note moved; the same one where a note would leave the limits */
export function studyBySemitones(study: DraftDocument, semitones: Semitones): DraftDocument {
  const chords = study.chords.map((chord) =>
    moveSelected(
      chord,
      chord.voices.map(({ id }) => id),
      semitones,
      study.key,
    ),
  );
  const stuck = chords.some((chord, index) => chord === study.chords[index] && chord.voices.length > 0);
  return stuck ? study : { ...study, chords };
}
