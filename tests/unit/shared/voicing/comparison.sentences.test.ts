import { describe, expect, it } from 'vitest';
import { compareVoicings } from '#shared/voicing/comparison';
import {
  clearestText,
  differenceText,
  limitChangeTexts,
  noteChangeTexts,
  registerChangeText,
  verdictText,
  whereText,
} from '#shared/voicing/comparison.sentences';
import { techniqueChanges } from '#shared/voicing/technique.words';
import type { Register } from '#shared/voicing/registers';
import { analysisOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

const NAMES = { held: 'A', now: 'B' };
const texts = (held: string, now: string) =>
  noteChangeTexts(compareVoicings(analysisOf(chordOf(held)), analysisOf(chordOf(now))), 'english');

describe('what became of the notes, in words', () => {
  it('when a note moves, then its interval and its new name are said', () => {
    expect(texts('Vc Bb2', 'Vc F3')).toEqual(['The cellos’ B♭2 moves up a fifth, to F3.']);
    expect(texts('DB D3', 'DB D2')).toEqual(['The double basses’ D3 moves down an octave, to D2.']);
  });

  it('when a note goes to another section, then that section is named, and its pitch where it is another', () => {
    expect(texts('Va C4', 'Vn2 C4')).toEqual(['The violas’ C4 goes to the second violins.']);
    const held = analysisOf(chordOf('Va C4'));
    const voices = analysisOf(chordOf('Vn2 E4')).voices;
    // The same note, by its id, dragged into another lane.
    expect(noteChangeTexts(compareVoicings(held, { ...held, voices }), 'english')).toEqual([
      'The violas’ C4 goes to the second violins, up a major third, to E4.',
    ]);
  });

  it('when notes go and come, then each has its sentence, from the top down', () => {
    const held = analysisOf(chordOf('Vc F2'));
    const now = {
      ...analysisOf(chordOf('Vn1 A5')),
      voices: analysisOf(chordOf('DB D2, Vn1 A5')).voices.slice(1),
    };
    expect(noteChangeTexts(compareVoicings(held, now), 'german')).toEqual([
      'The first violins’ A5 is new.',
      'The cellos’ F2 is gone.',
    ]);
  });

  it('when a note is played otherwise, then how is said', () => {
    const held = analysisOf(chordOf('Va C4'));
    const voices = held.voices.map((voice) => ({
      ...voice,
      ...{ players: 1, dynamic: 'pp' as const },
      technique: { ...voice.technique, mute: true, contact: 'sulTasto' as const },
    }));
    expect(noteChangeTexts(compareVoicings(held, { ...held, voices }), 'english')).toEqual([
      'The violas’ C4 stays, now sul tasto, con sordino, by 1 player instead of 8, pp instead of mf.',
    ]);
  });

  it('when nothing changed, then that is said', () => {
    expect(texts('Vc A2', 'Vc A2')).toEqual(['Every note is the same in both.']);
  });
});

describe('what became of the figures, in words', () => {
  const of = (great: number, small = 0) =>
    analysisOf(chordOf('Vc A2'), {
      registers: { great: { index: great, at: 40 }, small: { index: small, at: 50 } },
    });
  const other = (great: number, small = 0) => ({
    ...of(great, small),
    voices: analysisOf(chordOf('Vc G2')).voices,
  });

  it('when one is clearer, then it is named with the register that tells it', () => {
    const comparison = compareVoicings(of(52, 30), other(14, 30));
    expect(verdictText(comparison, NAMES)).toBe('B is clearer than A.');
    expect(whereText(comparison.registers)).toBe('most in the great octave, 52 → 14');
    expect(differenceText(comparison.index)).toBe('−22');
  });

  it('when the figures lie within their uncertainty, then there is no clear difference', () => {
    const comparison = compareVoicings(of(50), other(50.6));
    expect(verdictText(comparison, NAMES)).toBe('No clear difference between A and B.');
    expect(whereText(comparison.registers)).toBeNull();
  });

  it('when the change clouds, then that is said, and of equal voicings that they are', () => {
    expect(verdictText(compareVoicings(of(14), other(52)), NAMES)).toBe('B is more clouded than A.');
    expect(verdictText(compareVoicings(of(14), of(14)), NAMES)).toBe('B sounds the same as A.');
  });

  it.each([
    ['great', 52, 14, true, 'The great octave: 52 → 14, clearer.'],
    ['small', 20, 61, true, 'The small octave: 20 → 61, more clouded.'],
    ['one-line', 20, 20.4, false, 'The one-line octave: 20 → 20, no clear difference.'],
  ] as const)(
    'when the %s register is %d, then %d, then that is one sentence',
    (register, held, now, clear, text) => {
      expect(registerChangeText({ register: register satisfies Register, held, now, clear })).toBe(text);
    },
  );

  it('when figures differ, then the difference of what is shown has its sign', () => {
    expect(differenceText({ held: 20.4, now: 22.4 })).toBe('+2');
    expect(differenceText({ held: 22.6, now: 23.4 })).toBe('0');
  });
});

describe('what became of the limits, in words', () => {
  const limit = (lowerId: string, upperId: string, semitonesBelow: number) => ({
    ...{ lowerId, upperId, semitonesBelow },
    interval: 'm3',
    limit: 'C3',
  });

  it('when pairs go, come and stay, then each is said once', () => {
    const held = analysisOf(chordOf('DB D2, Vc F2 A2'), {
      limits: [limit('note-1', 'note-2', 10), limit('note-2', 'note-3', 5)],
    });
    const now = analysisOf(chordOf('DB D2, Vc F2 B2'), {
      limits: [limit('note-1', 'note-2', 10), limit('note-2', 'note-3', 1)],
    });
    const { limits } = compareVoicings(held, now);
    expect(limitChangeTexts(limits, held.voices, now.voices, 'english')).toEqual([
      'F2–A2 (Vc, Vc), a major third, stood under the low limit and is gone.',
      'F2–B2 (Vc, Vc), an augmented fourth, now stands 1 semitone under the low limit.',
      'D2–F2 (DB, Vc), a minor third, still stands under the low limit.',
    ]);
  });
});

describe('several voicings in words', () => {
  it('when one is clearly the clearest, then it is named alone', () => {
    expect(
      clearestText([
        { name: 'close', index: 80 },
        { name: 'open', index: 12 },
      ]),
    ).toBe('Clearest: open.');
  });

  it('when some lie within the uncertainty of the clearest, then that is said', () => {
    const voicings = [
      { name: 'close', index: 80 },
      { name: 'open', index: 30 },
      { name: 'wide', index: 30.5 },
    ];
    expect(clearestText(voicings)).toBe('Clearest: open. No clear difference from it: wide.');
    expect(clearestText(voicings.slice(1))).toBe(
      'No clear difference between any of them and the lowest figure.',
    );
    expect(clearestText(voicings.slice(2))).toBeNull();
  });
});

describe('techniques that change', () => {
  it('when each part changes, then each is told in the trade’s words', () => {
    const before = { contact: 'sulTasto', mute: true, stroke: 'sustained', harmonic: 'none' } as const;
    const after = { contact: 'ordinary', mute: false, stroke: 'pizzicato', harmonic: 'natural' } as const;
    expect(techniqueChanges(before, after)).toEqual([
      'ordinario',
      'senza sordino',
      'pizzicato',
      'a natural harmonic',
    ]);
    expect(techniqueChanges(before, before)).toEqual([]);
  });
});
