import { describe, expect, it } from 'vitest';
import { COMMON_PRACTICE_ORDERINGS } from '#shared/data/common-practice-orderings';
import { LOUDNESS_BANDS } from '#shared/data/equal-loudness';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { OPEN_CHORDS, PASSING_CHORDS } from '#shared/data/model-chords';
import { MUDDY_REGISTERS, REGISTER_RATINGS } from '#shared/data/register-ratings';
import { SCORE_CHORDS } from '#shared/data/score-chords';
import { midiOfName } from '#shared/pitch/names';
import { limitFindings } from '#shared/voicing/limits';

const notes = (names: readonly string[]) =>
  names.map((name, i) => ({ id: String(i), midi: midiOfName(name) }));

describe('tables', () => {
  it('when the orderings are read, then every note is a pitch and the notes rise', () => {
    expect(COMMON_PRACTICE_ORDERINGS).toHaveLength(20);
    for (const { muddier, clearer } of COMMON_PRACTICE_ORDERINGS) {
      for (const names of [muddier, clearer]) {
        const midi = names.map(midiOfName);
        expect(midi).toEqual([...midi].sort((a, b) => a - b));
      }
    }
  });

  it('when the ratings are read, then fourteen of the twenty lie in the muddy registers, from 0 to 10', () => {
    expect(REGISTER_RATINGS).toHaveLength(20);
    expect(REGISTER_RATINGS.filter(({ register }) => register <= MUDDY_REGISTERS)).toHaveLength(14);
    REGISTER_RATINGS.forEach(({ rating, midi }) => {
      expect(rating).toBeGreaterThan(0);
      expect(rating).toBeLessThan(10);
      expect(midi).toHaveLength(4);
    });
  });

  it('when the made chords are read, then the passing ones pass a limit and the open ones pass none', () => {
    PASSING_CHORDS.forEach((chord) =>
      expect(limitFindings(notes(chord.split(' '))).length).toBeGreaterThan(0),
    );
    OPEN_CHORDS.forEach((chord) => expect(limitFindings(notes(chord.split(' ')))).toEqual([]));
  });

  it('when the real chords are read, then each has parts whose notes are pitches', () => {
    expect(SCORE_CHORDS).toHaveLength(19);
    SCORE_CHORDS.forEach(({ parts }) =>
      parts.forEach(([, names]) => names.forEach((name) => expect(midiOfName(name)).toBeGreaterThan(20))),
    );
  });

  it('when the chart and the loudness table are read, then they rise', () => {
    LOW_INTERVAL_LIMITS.slice(1).forEach(({ semitones }, i) =>
      expect(semitones).toBeGreaterThan(LOW_INTERVAL_LIMITS[i]?.semitones ?? 0),
    );
    LOUDNESS_BANDS.slice(1).forEach(({ frequencyHz }, i) =>
      expect(frequencyHz).toBeGreaterThan(LOUDNESS_BANDS[i]?.frequencyHz ?? 0),
    );
    expect(LOUDNESS_BANDS).toHaveLength(29);
  });
});
