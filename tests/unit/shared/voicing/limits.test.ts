import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { SCORE_CHORDS } from '#shared/data/score-chords';
import { midiOfName } from '#shared/pitch/names';
import { limitFindings, ROOT_ELSEWHERE, rootBelow, rootFinding } from '#shared/voicing/limits';
import { analyseChord } from '#shared/voicing/analysis';
import { fromNearestVariant } from '#shared/voicing/calibration/limit-curves';
import { modelLimits } from '#shared/voicing/model-limits';
import type { PlayingSection } from '#shared/voicing/section-pairs';
import { pairIndex } from '#shared/voicing/section-pairs';
import { siltlineMap } from '#shared/voicing/siltline-map';
import { techniqueSchema } from '#shared/study/study.document';
import { chordOf, EVEN_SETTINGS } from '../../../support/voicings';

const notes = (...names: string[]) => names.map((name, i) => ({ id: `note-${i}`, midi: midiOfName(name) }));
const ordinary = techniqueSchema.parse({});
const playing = (section: PlayingSection['section'], more: Partial<PlayingSection> = {}): PlayingSection => ({
  section,
  players: 8,
  technique: ordinary,
  dynamic: 'mf',
  ...more,
});
const likeCellos = { lower: playing('cello'), upper: playing('cello'), a4Hz: 440 };

describe('the chart of low interval limits', () => {
  it('when the chart is read, then each limit stands on its printed note, within the published spread', () => {
    expect(LOW_INTERVAL_LIMITS.map(({ semitones }) => semitones)).toEqual([
      1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 13, 14, 15, 16,
    ]);
    for (const { lowest, lowestMidi, spread } of LOW_INTERVAL_LIMITS) {
      expect(midiOfName(lowest)).toBe(lowestMidi);
      expect(spread.low).toBeLessThanOrEqual(lowestMidi);
      expect(spread.high).toBeGreaterThanOrEqual(lowestMidi);
    }
  });

  it.each(LOW_INTERVAL_LIMITS.map((limit) => [limit.interval, limit] as const))(
    'when %s stands on its limit it is allowed, a semitone lower it is a semitone under',
    (_, { semitones, lowestMidi, interval }) => {
      const at = (midi: number) =>
        limitFindings([
          { id: 'lower', midi },
          { id: 'upper', midi: midi + semitones },
        ]);
      expect(at(lowestMidi)).toEqual([]);
      expect(at(lowestMidi - 1)).toMatchObject([
        { lowerId: 'lower', upperId: 'upper', interval, semitonesBelow: 1 },
      ]);
    },
  );

  it('when C2 and E2 sound, then the major third stands ten semitones under its limit B flat 2', () => {
    expect(limitFindings(notes('C2', 'E2'))).toEqual([
      { lowerId: 'note-0', upperId: 'note-1', interval: 'M3', limit: 'Bb2', semitonesBelow: 10 },
    ]);
  });

  it('when notes are not neighbours, then they are tested too, and the furthest under comes first', () => {
    const found = limitFindings(notes('G2', 'C2', 'E2'));
    expect(found.map(({ interval }) => interval)).toEqual(['M3', 'm3']);
  });

  it('when notes stand in unison, an octave, or wider than a tenth apart, then there is no limit', () => {
    expect(limitFindings(notes('C1', 'C1', 'C2', 'G3'))).toEqual([]);
  });

  it('when the root is played elsewhere, then it is tested just below the lowest note, and only where it is another', () => {
    expect(rootFinding(notes('E2', 'B2'), 0)).toEqual({
      lowerId: ROOT_ELSEWHERE,
      upperId: 'note-0',
      interval: 'M3',
      limit: 'Bb2',
      semitonesBelow: 10,
    });
    expect(rootFinding(notes('C2', 'G2'), 0)).toBeNull();
    expect(rootFinding(notes('E3', 'B3'), 0)).toBeNull();
    expect(rootFinding([], 0)).toBeNull();
  });

  it('when a root is played elsewhere, then it is taken just below the lowest note, as it is spelt', () => {
    expect(rootBelow(notes('B2', 'E2'), 'C')).toBe('C2');
    expect(rootBelow(notes('C3'), 'Bb')).toBe('Bb2');
    expect(rootBelow(notes('C3'), 'C')).toBe('C3');
    expect(rootBelow(notes('C3'), null)).toBeNull();
    expect(rootBelow([], 'C')).toBeNull();
  });

  it('when a chord is judged, then its own root elsewhere and its study’s own limits are what counts', () => {
    const chord = chordOf([{ pitch: 'E2' }, { pitch: 'B2' }]);
    const elsewhere = { ...chord, rootElsewhere: 'C' };
    expect(analyseChord(chord, EVEN_SETTINGS).limits).toEqual([]);
    expect(analyseChord(elsewhere, EVEN_SETTINGS)).toMatchObject({
      rootElsewhere: 'C2',
      limits: [{ lowerId: ROOT_ELSEWHERE, upperId: 'voice-0', semitonesBelow: 10 }],
    });
    const limits = [{ semitones: 7, lowest: 'F2' }];
    expect(analyseChord(elsewhere, { ...EVEN_SETTINGS, limits }).limits).toMatchObject([
      { lowerId: 'voice-0', upperId: 'voice-1', interval: 'P5', limit: 'F2', semitonesBelow: 1 },
    ]);
    expect(analyseChord(elsewhere, EVEN_SETTINGS).muddiness).toEqual(
      analyseChord(chord, EVEN_SETTINGS).muddiness,
    );
  });

  it('when a study has limits of its own, then they are the ones that count', () => {
    const own = [
      { interval: 'P5', semitones: 7, lowest: 'C4', lowestMidi: 60, spread: { low: 60, high: 60 } },
    ];
    expect(limitFindings(notes('C3', 'G3'), own)).toMatchObject([
      { interval: 'P5', limit: 'C4', semitonesBelow: 12 },
    ]);
    expect(limitFindings(notes('C2', 'E2'), own)).toEqual([]);
  });

  it('when the real chords are tested, then none is accused of a limit that it does not pass', () => {
    for (const { parts } of SCORE_CHORDS) {
      const voices = parts.flatMap(([section, pitches]) => pitches.map((pitch) => ({ section, pitch })));
      const { limits, muddiness } = analyseChord(chordOf(voices), EVEN_SETTINGS);
      expect(limits).toEqual([]);
      expect(Number.isFinite(muddiness.index)).toBe(true);
    }
  });
});

describe('limits by the model', () => {
  it('when two like cello sections are asked for, then sixteen intervals come out, each within two semitones of a published variant', () => {
    const limits = modelLimits(likeCellos);
    expect(limits.map(({ semitones }) => semitones)).toEqual(Array.from({ length: 16 }, (_, i) => i + 1));
    for (const { chart, exact, semitones } of limits) {
      const printed = LOW_INTERVAL_LIMITS.find((limit) => limit.semitones === semitones);
      expect(chart).toBe(printed?.lowestMidi ?? null);
      if (printed) expect(Math.abs(fromNearestVariant(exact ?? NaN, printed))).toBeLessThan(2);
    }
  });

  it('when an interval stands on the model’s limit, then its index is 50 or less, and over 50 a semitone lower', () => {
    for (const { model, semitones } of modelLimits(likeCellos)) {
      if (model === null) continue;
      expect(pairIndex(likeCellos, model, semitones)).toBeLessThanOrEqual(50);
      expect(pairIndex(likeCellos, model - 1, semitones)).toBeGreaterThan(50);
    }
  });

  it('when players or dynamics change alike in both, then the limits stay; where they differ, they move', () => {
    const exact = (pair: typeof likeCellos) => modelLimits(pair).map(({ exact: limit }) => limit ?? 0);
    const plain = exact(likeCellos);
    const many = exact({
      ...likeCellos,
      lower: playing('cello', { players: 20 }),
      upper: playing('cello', { players: 20 }),
    });
    many.forEach((limit, i) => expect(limit).toBeCloseTo(plain[i] ?? NaN, 6));
    const soft = exact({ ...likeCellos, upper: playing('cello', { dynamic: 'pp', players: 1 }) });
    expect(soft.filter((limit, i) => limit < (plain[i] ?? 0) - 0.5).length).toBeGreaterThan(10);
  });

  it('when both are muted or harmonic, then the model tells them from ordinary bowing', () => {
    const harmonic = { technique: { ...ordinary, harmonic: 'natural' as const } };
    const pair = { ...likeCellos, lower: playing('cello', harmonic), upper: playing('cello', harmonic) };
    expect(modelLimits(pair)).not.toEqual(modelLimits(likeCellos));
  });
});

describe('the siltline', () => {
  it('when the field is drawn, then each place holds the index of its two notes, and the limits lie where it is 50', () => {
    const map = siltlineMap(likeCellos, { lowest: 36, highest: 60, widest: 16 });
    expect(map.index).toHaveLength(25);
    expect(map.index.every((line) => line.length === 16)).toBe(true);
    fc.assert(
      fc.property(fc.integer({ min: 36, max: 60 }), fc.integer({ min: 1, max: 16 }), (lower, semitones) => {
        expect(map.index[lower - 36]?.[semitones - 1]).toBe(pairIndex(likeCellos, lower, semitones));
      }),
      { numRuns: 30 },
    );
    for (const { model, semitones } of modelLimits(likeCellos)) {
      if (model === null || model < 37 || model > 60) continue;
      expect(map.index[model - 36]?.[semitones - 1]).toBeLessThanOrEqual(50);
      expect(map.index[model - 37]?.[semitones - 1]).toBeGreaterThan(50);
    }
  });

  it('when the extent is empty, then the field is', () => {
    expect(siltlineMap(likeCellos, { lowest: 40, highest: 39, widest: 5 }).index).toEqual([]);
  });
});
