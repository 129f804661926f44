import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Chord } from '#shared/study/study.document';
import { DYNAMICS } from '#shared/study/study.document';
import { rangeOf } from '#shared/strings/ranges';
import { SECTIONS } from '#shared/strings/sections';
import { analyseChord } from '#shared/voicing/analysis';
import { twoCelloSections, voicingOf } from '#shared/voicing/calibration/yardsticks';
import { MUDDINESS_CONSTANTS } from '#shared/data/muddiness-constants';
import { joinUnisons } from '#shared/voicing/muddiness/joined';
import { densityOf, muddinessModel, peakDensity } from '#shared/voicing/muddiness/model';
import { modelFor } from '#shared/voicing/muddiness/models';
import { cloudiestOf, indexOf, registerPeaks } from '#shared/voicing/muddiness/scores';
import { sourcesOf } from '#shared/voicing/sound';
import { REGISTER_BOUNDS } from '#shared/voicing/registers';
import { chordOf, EVEN_SETTINGS, keyName, voicing } from '../../../support/voicings';

const model = modelFor(440);
const pitches = fc.integer({ min: 24, max: 96 }).map(keyName);
const chords = fc
  .array(
    fc.record({
      pitch: pitches,
      section: fc.constantFrom(...SECTIONS),
      players: fc.integer({ min: 1, max: 16 }),
    }),
    {
      minLength: 2,
      maxLength: 8,
    },
  )
  .map((voices) => chordOf(voices));

/** Each section from its lowest string up three octaves: what can be asked of players. */
const playable = fc
  .array(
    fc.constantFrom(...SECTIONS).chain((section) => {
      const { lowest } = rangeOf(section, 'four-string');
      return fc.record({
        section: fc.constant(section),
        pitch: fc.integer({ min: lowest, max: lowest + 36 }).map(keyName),
        players: fc.integer({ min: 1, max: 16 }),
      });
    }),
    { minLength: 2, maxLength: 8 },
  )
  .map((voices) => chordOf(voices));

const registersOf = (chord: Chord) =>
  analyseChord(chord, EVEN_SETTINGS).muddiness.registers.map(({ index }) => index);

const withDynamic = (chord: Chord, dynamic: Chord['dynamic']): Chord => ({ ...chord, dynamic });

describe('an octave lower', () => {
  const shapes = [
    ...Array.from({ length: 16 }, (_, i) => [0, i + 1]),
    ...[
      [0, 4, 7],
      [0, 3, 8],
      [0, 5, 9],
      [0, 3, 7],
      [0, 4, 9],
      [0, 5, 8],
      [0, 3, 6],
      [0, 3, 9],
      [0, 6, 9],
      [0, 4, 8],
    ],
  ];
  const C6 = 84;
  const C1 = 24;

  it('when any interval up to a tenth or any triad goes down from C6, then it is never clearer, ripples aside', () => {
    let compared = 0;
    const ripples: number[] = [];
    for (const shape of shapes) {
      for (let low = C6; low - 12 >= C1; low -= 1) {
        const high = peakDensity(model, voicingOf(shape.map((step) => low + step)));
        const lower = peakDensity(model, voicingOf(shape.map((step) => low - 12 + step)));
        compared += 1;
        if (lower < high * (1 - 1e-9)) ripples.push(1 - lower / high);
      }
    }
    expect(compared).toBe(shapes.length * (C6 - C1 - 11));
    expect(Math.max(0, ...ripples)).toBeLessThan(0.08);
    expect(ripples.length / compared).toBeLessThanOrEqual(0.01);
  });
});

describe('loudness', () => {
  it('when all dynamics change alike, then the index moves by less than a point', () => {
    for (const names of [
      'C2 G2 E3 C4 G4',
      'D2 A2 F3 D4 A4',
      'C3 E3 G3',
      'E2 G2 C3 E3 C4',
      'F2 A2 C3 F3 A3',
      'D2 D3 A3 F4 D5',
      'G2 D3',
    ]) {
      const at = DYNAMICS.map((dynamic) => analyseChord(withDynamic(voicing(names), dynamic), EVEN_SETTINGS));
      const indices = at.map(({ muddiness }) => muddiness.index);
      expect(Math.max(...indices) - Math.min(...indices)).toBeLessThan(1);
    }
  });

  it('when any chord is played as soft and as loud as can be, then its index moves by less than a point', () => {
    fc.assert(
      fc.property(chords, (chord) => {
        const soft = analyseChord(withDynamic(chord, 'ppp'), EVEN_SETTINGS).muddiness.index;
        const loud = analyseChord(withDynamic(chord, 'fff'), EVEN_SETTINGS).muddiness.index;
        expect(Math.abs(loud - soft)).toBeLessThan(1);
      }),
      { numRuns: 60 },
    );
  });
});

describe('a voice far above', () => {
  const BASES = [
    'C2 G2 E3',
    'D2 F2 A2 D3',
    'C2 E2 G2',
    'C3 E3 G3',
    'D2 A2 F3',
    'F1 F2 D3',
    'G2 B2 D3',
    'E2 B2',
  ];

  it('when a voice joins two octaves or more above, ordinary or 20 dB louder, then no register below it moves by more than 2', () => {
    for (const base of BASES) {
      const before = registersOf(voicing(base));
      const highest = Math.max(...sourcesOf(voicing(base), EVEN_SETTINGS).map(({ midi }) => midi));
      for (let above = highest + 24; above <= 88; above += 1) {
        for (const players of [8, 60]) {
          for (const dynamic of ['mf', 'fff'] as const) {
            const chord = voicing(base);
            const added = chordOf([
              ...chord.voices,
              { id: 'voice-far', pitch: keyName(above), section: 'violin1', players, dynamic },
            ]);
            const after = registersOf(added);
            REGISTER_BOUNDS.forEach(({ high }, i) => {
              if (high <= highest + 12)
                expect(Math.abs((after[i] ?? 0) - (before[i] ?? 0))).toBeLessThanOrEqual(2);
            });
          }
        }
      }
    }
  });
});

describe('voices', () => {
  it('when their order changes, then nothing else does', () => {
    fc.assert(
      fc.property(chords, (chord) => {
        const turned = { ...chord, voices: [...chord.voices].reverse() };
        expect(registersOf(turned)).toEqual(registersOf(chord));
      }),
      { numRuns: 60 },
    );
  });

  it('when a silent voice joins, then nothing changes', () => {
    const [base] = [joinUnisons(sourcesOf(voicing('C2 E2 G3 C5'), EVEN_SETTINGS), 440)];
    const silent = twoCelloSections(40, 3).map((voice) => ({ ...voice, energy: 0 }));
    expect(densityOf(model, [...silent, ...base])).toEqual(densityOf(model, base));
  });

  it('when two voices stand in unison, then they count as one of their joint energy', () => {
    const apart = chordOf([
      { pitch: 'C2', players: 3, section: 'cello' },
      { pitch: 'C2', players: 5, section: 'cello' },
      { pitch: 'E2', players: 8, section: 'cello' },
    ]);
    const joint = chordOf([
      { pitch: 'C2', players: 8, section: 'cello' },
      { pitch: 'E2', players: 8, section: 'cello' },
    ]);
    registersOf(apart).forEach((index, i) => expect(index).toBeCloseTo(registersOf(joint)[i] ?? NaN, 9));
  });

  it('when unlike sections stand in unison, then they do not cloud each other', () => {
    const unison = chordOf([
      { pitch: 'D3', players: 8, section: 'cello' },
      { pitch: 'D3', players: 8, section: 'viola' },
      { pitch: 'D3', players: 6, section: 'doubleBass' },
    ]);
    expect(analyseChord(unison, EVEN_SETTINGS).muddiness.index).toBe(0);
  });

  // Of 20,000 chords with notes that no string has one moved by more than 1: by 1.34, a violin on D1.
  it('when the axis is twice as fine, then no chord that can be played moves by more than 1 and no register by more than 2', () => {
    const fine = muddinessModel(MUDDINESS_CONSTANTS, 440, 0.25);
    const scores = (at: typeof model, chord: Chord) => {
      const peaks = registerPeaks(densityOf(at, joinUnisons(sourcesOf(chord, EVEN_SETTINGS), 440)), at.axis);
      const index = (density: number) => indexOf(density, MUDDINESS_CONSTANTS.threshold);
      return {
        chord: index(cloudiestOf(peaks)?.density ?? 0),
        registers: peaks.map(({ density }) => index(density)),
      };
    };
    fc.assert(
      fc.property(playable, (chord) => {
        const coarse = scores(model, chord);
        const finer = scores(fine, chord);
        expect(Math.abs(coarse.chord - finer.chord)).toBeLessThanOrEqual(1);
        coarse.registers.forEach((index, i) =>
          expect(Math.abs(index - (finer.registers[i] ?? NaN))).toBeLessThanOrEqual(2),
        );
      }),
      { numRuns: 100 },
    );
  });
});

describe('soundness', () => {
  it('when there is one voice or none, then the index is 0', () => {
    expect(analyseChord(chordOf([]), EVEN_SETTINGS).muddiness.index).toBe(0);
    for (let midi = 23; midi <= 108; midi += 1) {
      const { muddiness, pairs } = analyseChord(chordOf([{ pitch: keyName(midi) }]), EVEN_SETTINGS);
      expect(muddiness.index).toBe(0);
      expect(muddiness.register).toBeNull();
      expect(pairs).toEqual([]);
    }
  });

  it('when chords have up to 40 voices anywhere, then every figure is finite and from 0 to 100', () => {
    const voices = fc.array(
      fc.record({
        pitch: fc.integer({ min: 12, max: 119 }).map(keyName),
        section: fc.constantFrom(...SECTIONS),
        dynamic: fc.constantFrom(...DYNAMICS),
        technique: fc.record({
          contact: fc.constantFrom('ordinary' as const, 'sulTasto' as const, 'sulPonticello' as const),
          mute: fc.boolean(),
          stroke: fc.constantFrom('sustained' as const, 'tremolo' as const, 'pizzicato' as const),
          harmonic: fc.constantFrom('none' as const, 'natural' as const, 'artificial' as const),
        }),
      }),
      { minLength: 1, maxLength: 40 },
    );
    fc.assert(
      fc.property(
        voices,
        fc.constantFrom('equal' as const, 'pure' as const, 'pythagorean' as const),
        (given, intonation) => {
          const { muddiness, pairs } = analyseChord(chordOf(given), { ...EVEN_SETTINGS, intonation });
          for (const { index } of muddiness.registers) {
            expect(index).toBeGreaterThanOrEqual(0);
            expect(index).toBeLessThanOrEqual(100);
          }
          if (muddiness.index > 0) {
            expect(pairs.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 9);
          }
        },
      ),
      { numRuns: 40 },
    );
  });
});
