import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { midiOfName, parsePitch } from '#shared/pitch/names';
import { readLine, type LineContext } from '#shared/study/chord-line';
import { DEAL_WAYS, DEFAULT_DEAL, LOWEST_NOTES, TOP_TONES } from '#shared/study/harmony/deal-choice';
import { chroma, toneOf } from '#shared/study/harmony/harmony';
import { dealtText } from '#shared/study/harmony/harmony.sentences';
import { comfortableReach } from '#shared/study/reach';

const context: LineContext = {
  naming: 'english',
  reach: comfortableReach('four-string'),
  key: { tonic: 'C', mode: 'major' },
  deal: DEFAULT_DEAL,
  kept: [],
};
const read = (text: string, changes: Partial<LineContext> = {}) => readLine(text, { ...context, ...changes });
const pitches = (text: string, changes: Partial<LineContext> = {}) =>
  read(text, changes)
    .voices.map(({ pitch }) => pitch)
    .join(' ');
const midis = (text: string, changes: Partial<LineContext> = {}) =>
  read(text, changes).voices.map(({ pitch }) => midiOfName(pitch));
const gaps = (notes: readonly number[]) => notes.slice(1).map((note, index) => note - (notes[index] ?? note));

describe('whether a word is a chord or a note', () => {
  it.each([
    ['Dm7', 'Dm7'],
    ['C', 'C'],
    ['Db', 'Db'],
    ['Cb', 'Cb'],
    ['C6', 'C6'],
    ['C7', 'C7'],
    ['Eb6/9', 'Eb6/9'],
    ['V6/4', 'V6/4'],
    ['VI', 'VI'],
    ['  ii7 close ', 'ii7'],
    ['F9', 'F9'],
  ])('when “%s” stands alone, then it is the chord %s', (text, symbol) => {
    expect(read(text).dealt?.symbol).toBe(symbol);
    expect(read(text).voices).toHaveLength(5);
  });

  it.each([
    ['C4', 'C4'],
    ['Bb5', 'Bb5'],
    ['Vn1 C7', 'C7'],
    ['C7 E7', 'C7 E7'],
    ['A2+F3', 'A2 F3'],
  ])('when “%s” is typed, then they are the notes %s', (text, expected) => {
    expect(read(text).dealt).toBeNull();
    expect(pitches(text)).toBe(expected);
  });

  it.each([
    ['D-2', 'D-2', 'octaves run'],
    ['H2', 'H2', 'German'],
    ['C E G', 'C', 'octave'],
    ['Cm7x', 'x', 'cannot be read here'],
    [' G/X', 'X', 'bass'],
    ['V8', 'V8', 'section'],
    ['Vc', 'Vc', 'No note follows'],
    ['DB', 'DB', 'No note follows'],
  ])('when “%s” is typed, then “%s” is told', (text, place, words) => {
    const [fault] = read(text).faults;
    expect(text.slice(fault?.start, fault?.end)).toBe(place);
    expect(fault?.message).toContain(words);
  });

  it('when several notes lack their octaves, then each is told', () => {
    expect(read('C E G').faults).toHaveLength(3);
  });

  it('when a chord might be a note, then the line says how to write the note', () => {
    const { dealt } = read('C7');
    expect(dealt && dealtText(dealt, 'english')).toBe(
      'C7: C E G B♭, in open position. For the note write its section: Vn1 C7.',
    );
  });
});

describe('dealing a chord to the sections', () => {
  it('when a minor triad is dealt in each way, then it lies as an orchestra would have it', () => {
    const [open, close, series] = DEAL_WAYS.map((way) => midis('Dm', { deal: { ...DEFAULT_DEAL, way } }));
    // Open: the violas, seconds and firsts leave out a chord tone each; close: they leave out none.
    expect(Math.min(...gaps(open ?? []).slice(2))).toBeGreaterThanOrEqual(5);
    expect((close?.[4] ?? 0) - (close?.[2] ?? 0)).toBeLessThan(12);
    // Octave, fifth, fourth, third, as the first five partials of one tone.
    expect(gaps(series ?? []).map((gap, index, all) => gap <= (all[index - 1] ?? gap))).not.toContain(false);
    expect(gaps(series ?? []).slice(0, 2)).toEqual([12, 7]);
  });

  it('when more tones are named than there are sections, then the fifth is left out and told', () => {
    const { dealt } = read('C13');
    expect(dealt?.left.map(({ degree }) => degree)).toEqual([5]);
    expect(dealt && dealtText(dealt, 'english')).toContain('Left out: the fifth, G.');
  });

  it('when the top tone is chosen, then the first violins have it', () => {
    const top = (tone: (typeof TOP_TONES)[number], text: string) =>
      read(text, { deal: { ...DEFAULT_DEAL, top: tone } })
        .voices.at(-1)
        ?.pitch.slice(0, -1);
    expect(top('third', 'Dm7')).toBe('F');
    expect(top('seventh', 'Dm7')).toBe('C');
    expect(top('colour', 'Cmaj9')).toBe('D');
    expect(top('root', 'Bb')).toBe('Bb');
  });

  it('when the melody is locked, then it stays and the chord is laid under it', () => {
    const kept = [{ section: 'violin1', pitch: 'E5', stop: null }] as const;
    const { voices } = read('Am7', { kept });
    expect(voices.filter(({ section }) => section === 'violin1')).toEqual(kept);
    expect(Math.max(...voices.slice(0, -1).map(({ pitch }) => midiOfName(pitch)))).toBeLessThan(
      midiOfName('E5'),
    );
  });

  const roots = fc.constantFrom('C', 'Db', 'D', 'Eb', 'E', 'F', 'F#', 'G', 'Ab', 'A', 'Bb', 'B');
  const qualities = fc.constantFrom(
    '',
    'm',
    '7',
    'maj7',
    'm7',
    'dim7',
    'm7b5',
    'sus4',
    '6',
    '9',
    'm9',
    '13',
    'aug',
  );
  const basses = fc.constantFrom('', '/G', '/Bb', '/E');
  const deals = fc.record({
    way: fc.constantFrom(...DEAL_WAYS),
    top: fc.constantFrom(...TOP_TONES),
    lowest: fc.constantFrom(...LOWEST_NOTES),
  });

  it('when any chord is dealt, then the sections do not cross, each is in its range, the bass stands lowest and no third or seventh is missing', () => {
    fc.assert(
      fc.property(roots, qualities, basses, deals, (root, quality, bass, deal) => {
        const { voices, dealt, faults } = read(root + quality + bass, { deal });
        expect(faults).toEqual([]);
        const notes = voices.map(({ pitch }) => midiOfName(pitch));
        expect(Math.min(...gaps(notes))).toBeGreaterThan(0);
        for (const { section, pitch } of voices) {
          const { low, high } = context.reach[section];
          expect(midiOfName(pitch)).toBeGreaterThanOrEqual(low);
          expect(midiOfName(pitch)).toBeLessThanOrEqual(high);
        }
        const lowest = parsePitch(voices[0]?.pitch ?? '');
        expect(lowest && dealt && chroma(lowest) === chroma(dealt.harmony.bass)).toBe(true);
        for (const { pitch } of voices.slice(1)) {
          const note = parsePitch(pitch);
          expect(note && dealt && toneOf(dealt.harmony, note)).toBeDefined();
        }
        const missing = dealt?.left.map(({ degree }) => degree) ?? [];
        expect(missing.some((degree) => degree === 3 || degree === 4 || degree === 7)).toBe(false);
      }),
      { numRuns: 200 },
    );
  });
});
