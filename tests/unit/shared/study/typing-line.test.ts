import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { NOTE_NAMINGS } from '#shared/pitch/display';
import { SECTIONS } from '#shared/strings/sections';
import type { Reach } from '#shared/study/dealing';
import { emptyChord, newVoice } from '#shared/study/new-study';
import { parseTypingLine, type TypedVoice } from '#shared/study/typing-line';
import { typingLineOf } from '#shared/study/typing-line.text';

/** Where the sections are comfortable, near enough for dealing: E1–G3, C2–G4, C3–A5, G3–E6. */
const reach: Reach = {
  doubleBass: { low: 28, high: 55 },
  cello: { low: 36, high: 67 },
  viola: { low: 48, high: 81 },
  violin2: { low: 55, high: 88 },
  violin1: { low: 55, high: 88 },
};

const read = (text: string) => parseTypingLine(text, 'english', reach);
const brief = (voices: readonly TypedVoice[]) => voices.map(({ section, pitch }) => `${section} ${pitch}`);
const faults = (text: string) =>
  read(text).faults.map(({ start, end, message }) => [text.slice(start, end), message]);

describe('the typing line', () => {
  it('when sections are named, then the notes after each are divided among it', () => {
    expect(brief(read('DB D2, Vc A2 F3, Va A3, Vn2 D4, Vn1 A4').voices)).toEqual([
      'doubleBass D2',
      'cello A2',
      'cello F3',
      'viola A3',
      'violin2 D4',
      'violin1 A4',
    ]);
    expect(read('Vc A2 F3').voices.map(({ stop }) => stop)).toEqual([null, null]);
  });

  it('when notes are joined by +, then they are one double stop', () => {
    const { voices } = read('Vc A2+F3 D3, Va G3 + E4');
    expect(voices.map(({ stop }) => stop)).toEqual([1, 1, null, 2, 2]);
  });

  it('when no section is named, then the notes are dealt from the bottom', () => {
    expect(brief(read('D2 A2 F3 D4 A4').voices)).toEqual([
      'doubleBass D2',
      'cello A2',
      'viola F3',
      'violin2 D4',
      'violin1 A4',
    ]);
  });

  it('when a bare list is in no order, then it is dealt by pitch', () => {
    expect(brief(read('A4 F3 D2 D4 A2').voices)).toEqual(brief(read('D2 A2 F3 D4 A4').voices));
  });

  it('when bare notes are too high for the low sections, then they go to those that reach them', () => {
    expect(brief(read('C5 E5 G5').voices)).toEqual(['viola C5', 'violin2 E5', 'violin1 G5']);
  });

  it.each([
    ['vc a2', 'cello A2'],
    ['Vn I A4', 'violin1 A4'],
    ['vn.II:D4', 'violin2 D4'],
    ['V1 A4', 'violin1 A4'],
    ['first violins a4', 'violin1 A4'],
    ['Cb D2', 'doubleBass D2'],
    ['DB: Db2', 'doubleBass Db2'],
    ['double basses (D2)', 'doubleBass D2'],
    ['Cellos B♭2', 'cello Bb2'],
    ['va f♯3', 'viola F#3'],
    ['Va Fx3', 'viola F##3'],
    ['Va; F#3;', 'viola F#3'],
  ])('when “%s” is typed, then it is %s', (text, expected) => {
    expect(brief(read(text).voices)).toEqual([expected]);
  });

  it('when a flat D stands after a section, then it is the note and not the double basses', () => {
    expect(brief(read('Vc Db3 db2').voices)).toEqual(['cello Db3', 'cello Db2']);
  });

  it('when several things cannot be read, then each is told with its place and nothing is taken', () => {
    const text = 'DB D2, Vq A2, Vc X3 F9 A';
    expect(faults(text)).toEqual([
      ['Vq', '“Vq” is neither a note, such as Bb2, nor a section, such as Vc.'],
      ['X3', '“X3” is neither a note, such as Bb2, nor a section, such as Vc.'],
      ['F9', '“F9”: octaves run from 0 to 8; middle C is C4.'],
      ['A', '“A” needs its octave, such as A3.'],
    ]);
    expect(read(text).voices).toEqual([]);
  });

  it.each([
    ['D-2', 'D-2', 'octaves run'],
    ['H2', 'H2', 'German'],
    ['Vn A4', 'Vn', 'First or second violins'],
    ['Vc', 'Vc', 'No note follows'],
    ['Vc A2 +', '+', 'double stop'],
    ['+ A2', '+', 'double stop'],
    ['D2 Vc A2', 'D2', 'which section'],
  ])('when “%s” is typed, then “%s” is told', (text, place, words) => {
    const [fault] = faults(text);
    expect(fault?.[0]).toBe(place);
    expect(fault?.[1]).toContain(words);
  });

  it('when there are more than 40 notes, then those beyond are told', () => {
    const notes = Array.from({ length: 42 }, () => 'A3');
    const text = `Va ${notes.join(' ')}`;
    expect(faults(text)).toEqual([['A3 A3', 'A chord has at most 40 voices.']]);
    expect(read(`Va ${notes.slice(2).join(' ')}`).voices).toHaveLength(40);
  });

  it('when nothing is typed, then there are neither notes nor faults', () => {
    expect(read('  ,; ')).toEqual({ voices: [], faults: [] });
  });

  it('when names are German, then B and H are told apart', () => {
    expect(brief(parseTypingLine('Vc B2 H2 Es3', 'german', reach).voices)).toEqual([
      'cello Bb2',
      'cello B2',
      'cello Eb3',
    ]);
  });

  it('when a chord is written as a line and read again, then it is the same chord', () => {
    const pitch = fc
      .tuple(
        fc.constantFrom('C', 'D', 'E', 'F', 'G', 'A', 'B'),
        fc.constantFrom('', 'b', '#', 'bb', '##'),
        fc.integer({ min: 0, max: 8 }),
      )
      .map((parts) => parts.join(''));
    const voice = fc.record({ section: fc.constantFrom(...SECTIONS), pitch, joined: fc.boolean() });
    fc.assert(
      fc.property(fc.array(voice, { maxLength: 12 }), fc.constantFrom(...NOTE_NAMINGS), (voices, naming) => {
        const withStop = (section: string) =>
          voices.filter((v) => v.section === section && v.joined).length > 1;
        const chord = {
          ...emptyChord('chord-1'),
          voices: voices.map((v, index) => ({
            ...newVoice(`voice-${index}`, v.section, v.pitch),
            stop: v.joined && withStop(v.section) ? SECTIONS.indexOf(v.section) + 1 : null,
          })),
        };
        const again = parseTypingLine(typingLineOf(chord, naming), naming, reach);
        const sorted = (list: readonly TypedVoice[]) =>
          list.map((v) => `${v.section} ${v.pitch} ${v.stop !== null}`).sort();
        expect(again.faults).toEqual([]);
        expect(sorted(again.voices)).toEqual(sorted(chord.voices));
      }),
    );
  });

  it('when anything at all is typed, then every fault lies inside the text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (text) => {
        for (const { start, end } of read(text).faults) {
          expect(start).toBeGreaterThanOrEqual(0);
          expect(end).toBeGreaterThan(start);
          expect(end).toBeLessThanOrEqual(text.length);
        }
      }),
    );
  });
});
