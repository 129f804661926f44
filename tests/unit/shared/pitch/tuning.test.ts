import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { centsOf, fifthsOf, semitonesBetween } from '#shared/pitch/intervals';
import type { Pitch } from '#shared/pitch/names';
import { parsePitch } from '#shared/pitch/names';
import type { Tuning } from '#shared/pitch/tuning';
import { equalTempered, frequencyOf, midiOfFrequency } from '#shared/pitch/tuning';
import { input, numberOf, numbersOf, publishedRows, toleranceOf } from '../../../support/published';

function pitch(name: string): Pitch {
  const parsed = parsePitch(name);
  if (!parsed) throw new Error(`not a pitch: ${name}`);
  return parsed;
}

const equal: Tuning = { a4Hz: 440, intonation: 'equal', tonic: 'C', bass: null };

describe('frequencies', () => {
  it.each(publishedRows('pitch', 'midi').map((row) => [row.id, row] as const))(
    'when the MIDI note of %s sounds, then it has the published frequency',
    (_, row) => {
      const value = equalTempered(input(row, 'note', z.number()), 440);
      expect(Math.abs(value - numberOf(row))).toBeLessThanOrEqual(toleranceOf(row));
    },
  );

  it('when A4 is tuned lower, then every pitch follows', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 415, max: 466, noNaN: true }),
        fc.integer({ min: 12, max: 112 }),
        (a4Hz, midi) => {
          expect(equalTempered(midi, a4Hz) / equalTempered(midi, 440)).toBeCloseTo(a4Hz / 440, 12);
          expect(midiOfFrequency(equalTempered(midi, a4Hz), a4Hz)).toBeCloseTo(midi, 9);
        },
      ),
    );
  });
});

describe('intervals', () => {
  it.each(publishedRows('pitch', 'ratio').map((row) => [row.id, row] as const))(
    'when %s is measured in cents, then the published size comes out',
    (_, row) => {
      const [above = 0, below = 1] = input(row, 'ratio', z.string()).split('/').map(Number);
      expect(Math.abs(centsOf(above / below) - numberOf(row))).toBeLessThanOrEqual(toleranceOf(row));
    },
  );

  it.each(publishedRows('pitch', 'cents').map((row) => [row.id, row] as const))(
    'when the partial of %s is placed, then it lies off the nearest key by the published cents',
    (_, row) => {
      const cents = centsOf(input(row, 'n', z.number()));
      const [deviation = NaN, above = NaN] = numbersOf(row);
      expect(Math.abs(cents - above)).toBeLessThanOrEqual(toleranceOf(row));
      expect(Math.abs(cents - 100 * Math.round(cents / 100) - deviation)).toBeLessThanOrEqual(
        toleranceOf(row),
      );
    },
  );

  it('when notes are placed in the chain of fifths, then flats lie below C and sharps above', () => {
    expect(['Gb4', 'Bb4', 'F4', 'C4', 'G4', 'B4', 'F#4'].map((name) => fifthsOf(pitch(name)))).toEqual([
      -6, -2, -1, 0, 1, 5, 6,
    ]);
  });
});

describe('intonation', () => {
  it('when a chord is pure to its bass A3, then C#4 and E4 and A4 stand at 5/4, 3/2 and 2', () => {
    const tuning: Tuning = { ...equal, intonation: 'pure', bass: 57 };
    expect(frequencyOf(pitch('A3'), tuning)).toBeCloseTo(220, 10);
    expect(frequencyOf(pitch('C#4'), tuning)).toBeCloseTo(275, 10);
    expect(frequencyOf(pitch('E4'), tuning)).toBeCloseTo(330, 10);
    expect(frequencyOf(pitch('E5'), tuning)).toBeCloseTo(660, 10);
  });

  it('when pure intonation has no bass, then the pitch is tempered', () => {
    expect(frequencyOf(pitch('E4'), { ...equal, intonation: 'pure' })).toBe(frequencyOf(pitch('E4'), equal));
  });

  it.each([
    ['E', 'C', 407.82],
    ['F#', 'C', 611.73],
    ['Eb', 'C', 294.135],
    ['Db', 'C', 90.225],
    ['C#', 'C', 113.685],
    ['A', 'C', 905.865],
    ['B', 'C', 1109.775],
  ])(
    'when %s is tuned by fifths from %s, then it lies %f cents above it (Pythagorean table)',
    (note, tonic, cents) => {
      const tuning: Tuning = { ...equal, intonation: 'pythagorean', tonic };
      const ratio = frequencyOf(pitch(`${note}4`), tuning) / frequencyOf(pitch(`${tonic}4`), tuning);
      expect(centsOf(ratio)).toBeCloseTo(cents, 2);
    },
  );

  it('when two spellings of one key are tuned by fifths, then they lie a Pythagorean comma apart', () => {
    const tuning: Tuning = { ...equal, intonation: 'pythagorean', tonic: 'Bb' };
    const comma = centsOf(frequencyOf(pitch('G#3'), tuning) / frequencyOf(pitch('Ab3'), tuning));
    expect(comma).toBeCloseTo(23.46, 2);
  });

  it('when the tonic is no note, then the pitch is refused', () => {
    expect(() => frequencyOf(pitch('C4'), { ...equal, intonation: 'pythagorean', tonic: 'H' })).toThrow(
      RangeError,
    );
  });

  it('when any pitch is tuned in any way, then it stays within half a semitone of the key', () => {
    const names = fc.constantFrom('C', 'C#', 'Db', 'D', 'Eb', 'E', 'F', 'F#', 'G', 'Ab', 'A', 'Bb', 'B');
    fc.assert(
      fc.property(
        names,
        fc.integer({ min: 1, max: 7 }),
        fc.integer({ min: 24, max: 40 }),
        (name, octave, bass) => {
          const tempered = frequencyOf(pitch(`${name}${octave}`), equal);
          for (const intonation of ['pure', 'pythagorean'] as const) {
            const tuned = frequencyOf(pitch(`${name}${octave}`), { ...equal, intonation, bass });
            expect(Math.abs(semitonesBetween(tempered, tuned))).toBeLessThan(0.5);
          }
        },
      ),
    );
  });
});
