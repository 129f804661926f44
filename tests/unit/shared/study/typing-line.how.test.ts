import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { NOTE_NAMINGS } from '#shared/pitch/display';
import { SECTIONS } from '#shared/strings/sections';
import { emptyChord, newVoice } from '#shared/study/new-study';
import { comfortableReach } from '#shared/study/reach';
import {
  CONTACTS,
  DYNAMICS,
  HARMONICS,
  STROKES,
  chordSchema,
  type Chord,
} from '#shared/study/study.document';
import { applyTyped } from '#shared/study/typed.changes';
import { parseTypingLine } from '#shared/study/typing-line';
import { howText, PLAIN_HOW, readHow } from '#shared/study/typing-line.how';
import { typingLineOf } from '#shared/study/typing-line.text';

const reach = comfortableReach('four-string');
const read = (text: string) => parseTypingLine(text, 'english', reach);
const saidOf = (text: string) =>
  read(text).voices.map(({ pitch, how }) => `${pitch} ${howText(how ?? PLAIN_HOW)}`);
const faults = (text: string) =>
  read(text).faults.map(({ start, end, message }) => [text.slice(start, end), message]);
const counted = () => {
  let count = 0;
  return () => `made-${(count += 1)}`;
};

describe('how a note is played, in the line', () => {
  it.each([
    ['Vc A2[4 tasto muted tremolo pp III locked]', 'A2 4 tasto muted tremolo pp III locked'],
    ['Vc A2 [solo, sul ponticello, con sordino, p]', 'A2 solo ponticello muted p'],
    ['Vc A2 pizz ff', 'A2 pizz ff'],
    ['Vc A2[f]', 'A2 f'],
    ['Vc A2 sul G', 'A2 III'],
    ['Vc A2[string 4]', 'A2 IV'],
    ['Vn1 A5 nat. harm.', 'A5 harmonic'],
    ['Vn1 A5[artificial harmonic]', 'A5 artificial harmonic'],
    ['Va A3[6 players]', 'A3 6'],
    ['Va A3[solo div.]', 'A3 '],
    ['Va A3[pizz arco]', 'A3 '],
    ['DB E2 sul C', 'E2 IV'],
  ])('when “%s” is typed, then “%s” is read', (text, expected) => {
    expect(saidOf(text)).toEqual([expected]);
  });

  it('when it follows the section, then it is said of all of its notes, and a note may say otherwise', () => {
    expect(saidOf('Vc muted pp A2 F3[ff], Va A3')).toEqual(['A2 muted pp', 'F3 muted ff', 'A3 ']);
  });

  it('when notes of a double stop say it, then each has its own', () => {
    expect(saidOf('Vc D2[IV]+A2[III]')).toEqual(['D2 IV', 'A2 III']);
  });

  it('when strings are named as the reader names notes, then they are found', () => {
    const { voices } = parseTypingLine('Vc la2 sul sol', 'solfege', reach);
    expect(voices[0]?.how?.string).toBe(3);
  });

  it('when something in a bracket cannot be read, then each place is told with what was expected', () => {
    const told = faults('Vc A2[loud pp 99] F3[sul B]');
    expect(told.map(([place]) => place)).toEqual(['loud', '99', 'sul B']);
    expect(told[0]?.[1]).toContain('expected: players');
    expect(told[1]?.[1]).toBe('A note has 1 to 60 players.');
    expect(told[2]?.[1]).toBe('The cellos have no such string; they have A, D, G, C.');
  });

  it.each([
    ['Vc A2[pp', '[', 'not closed'],
    ['[pp] A2', '[pp]', 'which note'],
    ['Vc A2+[pp]F3', '[pp]', 'which note'],
    ['Va A3[V]', 'V', 'no such string'],
    ['Vc A2 f', 'f', 'for forte write [f]'],
  ])('when “%s” is typed, then “%s” is told', (text, place, words) => {
    const [fault] = faults(text);
    expect(fault?.[0]).toBe(place);
    expect(fault?.[1]).toContain(words);
  });

  it('when two notes have the same link, then they are linked, and one alone is not', () => {
    const linked = applyTyped(
      emptyChord('chord-1'),
      read('DB A1[link 1], Vc A2[link 1] E3[link 2]').voices,
      counted(),
    );
    const [bass, cello, upper] = linked.voices;
    expect(bass?.link).toBe(cello?.link);
    expect(bass?.link).not.toBeNull();
    expect(upper?.link).toBeNull();
  });

  it('when the word that the example gives is read, then it is what the example says', () => {
    expect(readHow('sul tasto', 0, 'outside', 'english')).toEqual({
      setting: { technique: { contact: 'sulTasto' } },
      end: 9,
    });
    expect(howText({ ...PLAIN_HOW, players: 1, dynamic: 'pp' })).toBe('solo pp');
  });
});

describe('a chord written as a line and read again', () => {
  const oneOf = <T>(values: readonly T[]) => fc.constantFrom(...values);
  const technique = fc.record({
    contact: oneOf(CONTACTS),
    mute: fc.boolean(),
    stroke: oneOf(STROKES),
    harmonic: oneOf(HARMONICS),
  });
  const voice = fc.record({
    section: oneOf(SECTIONS),
    pitch: oneOf(['C3', 'Eb3', 'F#3', 'Bb3', 'B3', 'A##4', 'Dbb4']),
    technique,
    players: fc.option(fc.integer({ min: 1, max: 60 })),
    dynamic: fc.option(oneOf(DYNAMICS)),
    string: fc.option(fc.integer({ min: 1, max: 4 })),
    locked: fc.boolean(),
    stop: fc.option(fc.integer({ min: 1, max: 2 })),
    link: fc.option(oneOf(['link-aaa', 'link-bbb'])),
  });
  /** A double stop or a link of one note is none: the document would not keep it so. */
  const sound = (chord: Chord): Chord =>
    applyTyped(
      chord,
      chord.voices.map(({ section, pitch, stop }) => ({ section, pitch, stop })),
      counted(),
    );

  it('when it is any chord, then every attribute comes back, and every voice is the same one', () => {
    fc.assert(
      fc.property(fc.array(voice, { maxLength: 10 }), oneOf(NOTE_NAMINGS), (parts, naming) => {
        const voices = parts.map((part, index) => ({
          ...newVoice(`voice-${index}`, part.section, part.pitch),
          ...part,
        }));
        const chord = chordSchema.parse(sound({ ...emptyChord('chord-1'), voices }));
        const line = typingLineOf(chord, naming);
        const again = parseTypingLine(line, naming, reach);
        expect(again.faults).toEqual([]);
        const typed = applyTyped(chord, again.voices, counted());
        expect(typingLineOf(typed, naming)).toBe(line);
        const byId = (a: { id: string }, b: { id: string }) => (a.id < b.id ? -1 : 1);
        const told = (of: Chord) =>
          [...of.voices].sort(byId).map(({ id: _, stop, link, ...rest }) => ({
            ...rest,
            stop: stop !== null,
            link: link !== null,
          }));
        expect(
          told(typed)
            .map((v) => JSON.stringify(v))
            .sort(),
        ).toEqual(
          told(chord)
            .map((v) => JSON.stringify(v))
            .sort(),
        );
      }),
    );
  });
});
