import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Section } from '#shared/strings/sections';
import { compareVoicings, soundTheSame, underLimits } from '#shared/voicing/comparison';
import { matchNotes, type MatchNote } from '#shared/voicing/matching';
import { analysisOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

const note = (id: string, section: Section, midi: number): MatchNote => ({ id, section, midi });
const paired = (held: readonly MatchNote[], now: readonly MatchNote[]) =>
  matchNotes(held, now).map((match) => [match.held?.id ?? null, match.now?.id ?? null]);

describe('which note has whose part', () => {
  it('when a note sounds the same in the same section, then it is its own counterpart, whatever its id', () => {
    const held = [note('a', 'cello', 45), note('b', 'cello', 53)];
    const now = [note('b', 'cello', 45), note('a', 'cello', 53)];
    expect(paired(held, now)).toEqual([
      ['b', 'a'],
      ['a', 'b'],
    ]);
  });

  it('when a note has moved to another lane, then its id tells that it is the same', () => {
    expect(paired([note('a', 'viola', 53)], [note('a', 'cello', 53)])).toEqual([['a', 'a']]);
  });

  it('when a section plays other notes, then its lines keep their order and move as little as they can', () => {
    // C and E♭ become D and B♭: crossing lines would move 10 + 1 semitones, these move 2 + 7.
    const held = [note('c', 'cello', 48), note('e', 'cello', 51)];
    const now = [note('d', 'cello', 50), note('b', 'cello', 58)];
    expect(paired(held, now)).toEqual([
      ['e', 'b'],
      ['c', 'd'],
    ]);
  });

  it('when a section has fewer notes now, then the nearest go on and the other is gone', () => {
    const held = [note('low', 'cello', 36), note('mid', 'cello', 45), note('top', 'cello', 52)];
    const now = [note('x', 'cello', 46), note('y', 'cello', 53)];
    expect(paired(held, now)).toEqual([
      ['top', 'y'],
      ['mid', 'x'],
      ['low', null],
    ]);
  });

  it('when another section plays the pitch now, then it has taken it over', () => {
    expect(paired([note('a', 'viola', 60)], [note('z', 'violin2', 60)])).toEqual([['a', 'z']]);
  });

  it('when nothing fits, then one is gone and the other new', () => {
    expect(paired([note('a', 'viola', 60)], [note('z', 'violin2', 67)])).toEqual([
      [null, 'z'],
      ['a', null],
    ]);
  });

  it('when any two voicings are matched, then every note of both stands there once', () => {
    const notes = (prefix: string) =>
      fc
        .array(
          fc.record({
            section: fc.constantFrom<Section>('cello', 'viola'),
            midi: fc.integer({ min: 36, max: 60 }),
          }),
          {
            maxLength: 7,
          },
        )
        .map((all) => all.map((one, index) => ({ ...one, id: `${prefix}${index}` })));
    fc.assert(
      fc.property(notes('h'), notes('n'), (held, now) => {
        const matches = matchNotes(held, now);
        const ids = (side: 'held' | 'now') => matches.flatMap((match) => match[side]?.id ?? []).sort();
        expect(ids('held')).toEqual(held.map(({ id }) => id).sort());
        expect(ids('now')).toEqual(now.map(({ id }) => id).sort());
      }),
    );
  });
});

describe('two voicings beside each other', () => {
  const limit = (lowerId: string, upperId: string) => ({
    ...{ lowerId, upperId, semitonesBelow: 4 },
    interval: 'm3',
    limit: 'C3',
  });

  it('when notes change, then each is told as staying, moved, given, gone or new, from the top down', () => {
    const held = analysisOf(chordOf('DB D2, Vc A2 F3, Va C4'));
    const now = analysisOf(chordOf('DB D2, Vc A2 G3, Vn2 C4, Vn1 E5'));
    const { notes } = compareVoicings(held, now);
    expect(notes.map(({ kind, held: before, now: after }) => [kind, before?.pitch, after?.pitch])).toEqual([
      ['new', undefined, 'E5'],
      ['given', 'C4', 'C4'],
      ['moved', 'F3', 'G3'],
      ['stays', 'A2', 'A2'],
      ['stays', 'D2', 'D2'],
    ]);
  });

  it('when only the mute comes on, then the note stays and is played otherwise', () => {
    const held = analysisOf(chordOf('Va C4'));
    const voices = held.voices.map((voice) => ({ ...voice, technique: { ...voice.technique, mute: true } }));
    const comparison = compareVoicings(held, { ...held, voices });
    expect(comparison.notes.map(({ kind }) => kind)).toEqual(['played']);
    expect(soundTheSame(comparison)).toBe(false);
    expect(soundTheSame(compareVoicings(held, held))).toBe(true);
  });

  it('when registers differ, then each tells whether it differs clearly', () => {
    const chord = chordOf('Vc A2');
    const { index, registers } = compareVoicings(
      analysisOf(chord, { registers: { great: { index: 52, at: 40 }, small: { index: 30, at: 50 } } }),
      analysisOf(chord, { registers: { great: { index: 14, at: 40 }, small: { index: 30.4, at: 50 } } }),
    );
    const of = (name: string) => registers.find(({ register }) => register === name);
    expect(registers).toHaveLength(7);
    expect(of('great')).toEqual({ register: 'great', held: 52, now: 14, clear: true });
    expect(of('small')).toEqual({ register: 'small', held: 30, now: 30.4, clear: false });
    expect(index).toEqual({ held: 52, now: 30.4, clear: true });
  });

  it('when pairs stood or stand under their limit, then those that went, stay and came are told apart', () => {
    const held = analysisOf(chordOf('DB D2, Vc F2 A2'), {
      limits: [limit('note-1', 'note-2'), limit('note-2', 'note-3')],
    });
    const now = analysisOf(chordOf('DB D2, Vc F2 B2'), {
      limits: [limit('note-1', 'note-2'), limit('note-2', 'note-3')],
    });
    const { gone, stay, come } = compareVoicings(held, now).limits;
    const ids = (limits: readonly { lowerId: string; upperId: string }[]) =>
      limits.map(({ lowerId, upperId }) => `${lowerId} ${upperId}`);
    expect(underLimits({ gone, stay: [], come: [] })).toEqual({ held: 1, now: 0 });
    expect(underLimits({ gone, stay, come })).toEqual({ held: 2, now: 2 });
    expect(ids(gone)).toEqual(['note-2 note-3']);
    expect(ids(stay)).toEqual(['note-1 note-2']);
    expect(ids(come)).toEqual(['note-2 note-3']);
  });
});
