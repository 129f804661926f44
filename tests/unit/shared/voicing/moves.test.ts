import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { midiOfName } from '#shared/pitch/names';
import { rangeOf } from '#shared/strings/ranges';
import { SECTIONS } from '#shared/strings/sections';
import type { Chord } from '#shared/study/study.document';
import { analyseChord, explainRegister } from '#shared/voicing/analysis';
import { fullAnalysis } from '#shared/voicing/full-analysis';
import { helpfulMoves } from '#shared/voicing/moves/helpful-moves';
import { moveTrial } from '#shared/voicing/moves/move-trial';
import { movedVoices } from '#shared/voicing/moves/moves';
import { possibleMoves } from '#shared/voicing/moves/possible-moves';
import { indexOf } from '#shared/voicing/muddiness/scores';
import { modelFor } from '#shared/voicing/muddiness/models';
import { REGISTERS } from '#shared/voicing/registers';
import { differClearly } from '#shared/voicing/uncertainty';
import { chordOf, EVEN_SETTINGS, keyName, voicing } from '../../../support/voicings';

const indexAfter = (chord: Chord, voices: Chord['voices'], settings = EVEN_SETTINGS) =>
  analyseChord({ ...chord, voices: [...voices] }, settings).muddiness.index;

const chords = fc
  .array(
    fc.record({
      pitch: fc.integer({ min: 28, max: 76 }).map(keyName),
      section: fc.constantFrom(...SECTIONS),
    }),
    {
      minLength: 2,
      maxLength: 7,
    },
  )
  .map((voices) => chordOf(voices));

describe('moves that help', () => {
  it('when a close low chord is looked at, then moves are offered, the most helpful first, each clearly better', () => {
    const moves = helpfulMoves(voicing('D2 F2 A2 D3 A3'), EVEN_SETTINGS);
    expect(moves.length).toBeGreaterThan(0);
    expect(moves.length).toBeLessThanOrEqual(8);
    moves.forEach(({ before, after, lost }, i) => {
      expect(after).toBeLessThan(before);
      expect(differClearly(before, after)).toBe(true);
      const last = moves[i - 1];
      if (last?.lost === null) expect(lost !== null || after >= last.after).toBe(true);
      else if (last) expect(lost !== null && after >= last.after).toBe(true);
    });
  });

  it('when a move takes away the only third, then it says which, and stands behind those that keep every tone', () => {
    const moves = helpfulMoves(voicing('D2 F2 A2 D3 A3'), EVEN_SETTINGS);
    expect(moves[0]?.lost).toBeNull();
    for (const { ids, lost, pitches } of moves) {
      if (lost === null) continue;
      expect(ids).toHaveLength(1);
      expect(lost).toBe('F2');
      expect(pitches.some((pitch) => pitch.startsWith('F'))).toBe(false);
    }
  });

  it('when any move of any chord is tried, then before and after are the indices of the chord before and after', () => {
    fc.assert(
      fc.property(
        chords,
        fc.constantFrom('equal' as const, 'pure' as const, 'pythagorean' as const),
        (chord, intonation) => {
          const settings = { ...EVEN_SETTINGS, intonation };
          const { threshold } = modelFor(440).constants;
          const trial = moveTrial(chord, settings, modelFor(440));
          expect(indexOf(trial.before(), threshold)).toBeCloseTo(
            indexAfter(chord, chord.voices, settings),
            9,
          );
          for (const move of possibleMoves(chord.voices, 'four-string')) {
            const after = indexAfter(chord, [...movedVoices(chord.voices, move)], settings);
            expect(indexOf(trial.after(move), threshold)).toBeCloseTo(after, 9);
          }
        },
      ),
      { numRuns: 8 },
    );
  });

  it('when a density would be useless, then a move is either weighed in full or known to lie above it', () => {
    const model = modelFor(440);
    fc.assert(
      fc.property(chords, fc.double({ min: 0.3, max: 1.1, noNaN: true }), (chord, part) => {
        const trial = moveTrial(chord, EVEN_SETTINGS, model);
        const useless = trial.before() * part;
        for (const move of possibleMoves(chord.voices, 'four-string')) {
          const whole = trial.after(move);
          const told = trial.after(move, useless);
          if (told === whole) continue;
          expect(told).toBeGreaterThan(useless);
          expect(whole).toBeGreaterThanOrEqual(told);
        }
      }),
      { numRuns: 20 },
    );
  });

  it('when a chord is clear, then nothing is offered', () => {
    expect(helpfulMoves(voicing('C5 E5 G5'), EVEN_SETTINGS)).toEqual([]);
    expect(helpfulMoves(chordOf([]), EVEN_SETTINGS)).toEqual([]);
  });
});

describe('possible moves', () => {
  it('when a voice is locked, then it stays where it is', () => {
    const chord = chordOf([{ pitch: 'C2' }, { pitch: 'E2', locked: true }, { pitch: 'G3' }]);
    const moved = possibleMoves(chord.voices, 'four-string').flatMap(({ ids }) => ids);
    expect(moved).not.toContain('voice-1');
    expect(moved).toContain('voice-0');
  });

  it('when voices are linked, then they move together and keep their octave', () => {
    const chord = chordOf([
      { pitch: 'C2', section: 'doubleBass', link: 'link-01' },
      { pitch: 'C3', section: 'cello', link: 'link-01' },
      { pitch: 'G3' },
    ]);
    const shifts = possibleMoves(chord.voices, 'four-string').filter(({ ids }) => ids.length === 2);
    expect(shifts.length).toBeGreaterThan(0);
    for (const { pitches } of shifts) {
      if (pitches.length === 0) continue;
      expect(midiOfName(pitches[1] ?? '') - midiOfName(pitches[0] ?? '')).toBe(12);
    }
  });

  it('when any moves are offered, then every note stays within its section’s reach and is a tone of the chord', () => {
    fc.assert(
      fc.property(chords, (chord) => {
        const tones = new Set(chord.voices.map(({ pitch }) => midiOfName(pitch) % 12));
        for (const { kind, pitches, section } of possibleMoves(chord.voices, 'four-string')) {
          for (const pitch of pitches) {
            const midi = midiOfName(pitch);
            const { lowest, orchestralTop } = rangeOf(section, 'four-string');
            expect(tones.has(midi % 12)).toBe(true);
            expect(midi).toBeGreaterThanOrEqual(lowest);
            expect(midi).toBeLessThanOrEqual(orchestralTop);
          }
          expect(pitches.length === 0).toBe(kind === 'leaveOut');
        }
      }),
    );
  });
});

describe('explanation', () => {
  it('when a chord clouds, then the shares of its pairs add up to 1 in every register it reaches, largest first', () => {
    const chord = voicing('D2 F2 A2 D3 A3');
    for (const register of REGISTERS) {
      const pairs = explainRegister(chord, EVEN_SETTINGS, register);
      if (register === 'subcontra') continue;
      expect(pairs.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 9);
      pairs.slice(1).forEach(({ share }, i) => expect(share).toBeLessThanOrEqual(pairs[i]?.share ?? 0));
      pairs.forEach(({ meetings }) => {
        expect(meetings.length).toBeLessThanOrEqual(3);
        expect(meetings.reduce((sum, { share }) => sum + share, 0)).toBeLessThanOrEqual(1 + 1e-9);
      });
    }
  });

  it('when C2 and E2 meet alone, then their fundamentals are named, 17 Hz apart', () => {
    const { pairs } = analyseChord(voicing('C2 E2'), EVEN_SETTINGS);
    expect(pairs).toHaveLength(1);
    expect(pairs[0]).toMatchObject({ lowerId: 'voice-0', upperId: 'voice-1', share: 1 });
    expect(pairs[0]?.meetings[0]).toMatchObject({ lowerN: 1, upperN: 1 });
    expect(pairs[0]?.meetings[0]?.differenceHz).toBeCloseTo(82.4069 - 65.4064, 3);
  });

  it('when two sections double a note, then they share its part by their energy', () => {
    const { pairs } = analyseChord(
      chordOf([
        { pitch: 'C2', section: 'cello', players: 6 },
        { pitch: 'C2', section: 'cello', players: 2 },
        { pitch: 'E2', section: 'cello', players: 8 },
      ]),
      EVEN_SETTINGS,
    );
    expect(pairs.map(({ lowerId }) => lowerId)).toEqual(['voice-0', 'voice-1']);
    expect(pairs[0]?.share).toBeCloseTo(0.75, 9);
  });

  it('when a chord stands bare, then a register where nothing clouds has no explanation', () => {
    expect(explainRegister(voicing('C2'), EVEN_SETTINGS, 'great')).toEqual([]);
  });
});

describe('the full analysis', () => {
  it('when a chord is analysed in full, then it holds the ordinary analysis and everything besides', () => {
    const chord = voicing('C2 E2 G3 C5');
    const full = fullAnalysis(chord, EVEN_SETTINGS);
    expect(full).toMatchObject(analyseChord(chord, EVEN_SETTINGS));
    expect(full.balance.voices).toHaveLength(4);
    expect(full.density.registers).toHaveLength(7);
    expect(full.character.spread).toBe(36);
    expect(full.moves).toEqual(helpfulMoves(chord, EVEN_SETTINGS));
  });
});
