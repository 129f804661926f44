import { Chord } from 'tonal';
import { describe, expect, it } from 'vitest';
import { noteName } from '#shared/pitch/display';
import { readChordSymbol } from '#shared/study/harmony/chord-symbol';
import { chroma, toneName, type Harmony } from '#shared/study/harmony/harmony';

const harmonyOf = (text: string, naming: 'english' | 'german' | 'solfege' = 'english'): Harmony => {
  const read = readChordSymbol(text, naming);
  if (!read || !('harmony' in read)) throw new Error(`${text} was not read`);
  return read.harmony;
};
const names = ({ root, tones }: Harmony) =>
  tones.map((tone) => noteName({ ...toneName(root, tone), octave: 4 }, 'english'));
const ascii = (name: string) => name.replaceAll('♭', 'b').replaceAll('♯', '#');
const faultOf = (text: string) => {
  const read = readChordSymbol(text, 'english');
  if (!read || !('fault' in read)) throw new Error(`${text} was read`);
  return { place: text.slice(read.fault.start, read.fault.end), message: read.fault.message };
};

/** Qualities that tonal reads too; where custom leaves the fifth out of an altered 13, it differs. */
const QUALITIES = [
  ...[
    '',
    'm',
    'dim',
    'aug',
    '7',
    'maj7',
    'M7',
    'm7',
    'dim7',
    'm7b5',
    '6',
    'm6',
    '9',
    'maj9',
    'm9',
    '11',
    'm11',
  ],
  ...[
    '13',
    'maj13',
    'm13',
    'sus4',
    'sus2',
    '7sus4',
    '7b9',
    '7#9',
    '7b5',
    '7#5',
    '7#11',
    'mM7',
    '69',
    'm69',
    '5',
  ],
  ...['6/9', 'ø', 'o7', '9sus4', 'maj7#11', '9b5', 'maj9#11', '-7', '+'],
];

describe('a chord symbol', () => {
  it.each(QUALITIES)(
    'when “%s” follows a root, then the notes are those of an independent library',
    (quality) => {
      for (const root of ['C', 'Db', 'D', 'Eb', 'E', 'F', 'F#', 'G', 'Ab', 'A', 'Bb', 'B']) {
        const theirs = Chord.get(root + quality);
        expect(theirs.empty, root + quality).toBe(false);
        expect(
          names(harmonyOf(root + quality))
            .map(ascii)
            .sort(),
        ).toEqual([...theirs.notes].sort());
      }
    },
  );

  it.each([
    ['Bbm7', 'B♭ D♭ F A♭'],
    ['G/B', 'G B D'],
    ['Cmaj9', 'C E G B D'],
    ['F#dim7', 'F♯ A C E♭'],
    ['Dsus4', 'D G A'],
    ['Eb6/9', 'E♭ G B♭ C F'],
    ['C7(b9,#11)', 'C E G B♭ D♭ F♯'],
    ['C7b9#9', 'C E G B♭ D♭ D♯'],
    ['Am(maj7)', 'A C E G♯'],
    ['CΔ', 'C E G B'],
    ['Cadd9', 'C E G D'],
    ['C7no5', 'C E B♭'],
    ['bb', 'B♭ D F'],
  ])('when %s is typed, then it has %s', (text, expected) => {
    expect(names(harmonyOf(text)).join(' ')).toBe(expected);
  });

  it('when a bass is given, then it stands lowest, of the chord or not', () => {
    expect(harmonyOf('Bbm7/Db').bass).toEqual({ letter: 'D', alteration: -1 });
    expect(harmonyOf('C/D').bass).toEqual({ letter: 'D', alteration: 0 });
    expect(harmonyOf('Eb6/9/G').bass).toEqual({ letter: 'G', alteration: 0 });
  });

  it('when notes are named in German or solfège, then the root is', () => {
    expect(names(harmonyOf('B7', 'german'))[0]).toBe('B♭');
    expect(names(harmonyOf('Hm7', 'german'))[0]).toBe('B');
    expect(names(harmonyOf('Esm', 'german'))[0]).toBe('E♭');
    expect(names(harmonyOf('Asus4', 'german')).join(' ')).toBe('A D E');
    expect(names(harmonyOf('sibm7/réb', 'solfege')).join(' ')).toBe('B♭ D♭ F A♭');
    expect(names(harmonyOf('sol7', 'solfege'))[0]).toBe('G');
  });

  it.each([
    ['Cm7x', 'x'],
    ['Dq', 'q'],
    ['G/X', 'X'],
    ['G/', '/'],
    ['Bbm7b4', 'b4'],
  ])('when %s is typed, then the fault is %s', (text, place) => {
    expect(faultOf(text).place).toBe(place);
  });

  it('when no note begins the word, then it is no symbol', () => {
    expect(readChordSymbol('xyz', 'english')).toBeNull();
  });

  it('when a tone would take three accidentals, then it is spelt by a neighbour and sounds the same', () => {
    const root = { letter: 'D', alteration: -2 } as const;
    const tone = { degree: 7, semitones: 9 } as const;
    const name = toneName(root, tone);
    expect(Math.abs(name.alteration)).toBeLessThanOrEqual(2);
    expect(chroma(name)).toBe((chroma(root) + 9) % 12);
  });
});
