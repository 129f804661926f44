import fc from 'fast-check';
import { Interval, Note } from 'tonal';
import { describe, expect, it } from 'vitest';
import { midiOfName, parsePitch } from '#shared/pitch/names';
import { frequencyOf } from '#shared/pitch/tuning';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';

/** An independent reference: the general-purpose library of music theory that the product also installs. */
const names = fc
  .tuple(
    fc.constantFrom('A', 'B', 'C', 'D', 'E', 'F', 'G'),
    fc.constantFrom('', '#', 'b', '##', 'bb'),
    fc.integer({ min: 0, max: 8 }),
  )
  .map(([letter, sign, octave]) => `${letter}${sign}${octave}`);

describe('against an independent library', () => {
  it('when any pitch is named, then its MIDI number and frequency are the same there', () => {
    fc.assert(
      fc.property(names, (name) => {
        const pitch = parsePitch(name);
        if (!pitch) throw new Error(name);
        const tuning = { a4Hz: 440, intonation: 'equal' as const, tonic: 'C', bass: null };
        expect(midiOfName(name)).toBe(Note.midi(name));
        expect(frequencyOf(pitch, tuning)).toBeCloseTo(Note.freq(name) ?? NaN, 6);
      }),
    );
  });

  it('when the chart’s intervals are named there, then they have as many semitones', () => {
    const theirs: Readonly<Record<string, string>> = { 'A4/d5': '4A' };
    for (const { interval, semitones } of LOW_INTERVAL_LIMITS) {
      const name = theirs[interval] ?? `${interval.slice(1)}${interval.slice(0, 1)}`;
      expect(Interval.semitones(name)).toBe(semitones);
    }
  });
});
