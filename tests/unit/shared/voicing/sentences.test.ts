import { describe, expect, it } from 'vitest';
import { overtonesSummary } from '#shared/voicing/overtones.sentences';
import { findingsOf, headlineOf } from '#shared/voicing/sentences';
import { changeText, factsOf } from '#shared/voicing/voice.sentences';
import { hertzText, registerName, semitonesText } from '#shared/voicing/words';
import { reachOf } from '#shared/voicing/reach.sentences';
import { ROOT_ELSEWHERE } from '#shared/voicing/limits';
import type { PairShare } from '#shared/voicing/analysis';
import { analysisOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

const chord = chordOf('DB D2, Vc F2 A2');
const limit = (lowerId: string, upperId: string, semitonesBelow: number) => ({
  ...{ lowerId, upperId, semitonesBelow },
  interval: 'm3',
  limit: 'C3',
});
const share = (
  lowerId: string,
  upperId: string,
  part: number,
  meeting: readonly [number, number, number],
): PairShare => ({
  ...{ lowerId, upperId, register: 'great', share: part },
  meetings: [{ lowerN: meeting[0], upperN: meeting[1], differenceHz: meeting[2], share: 1 }],
});
const texts = (analysis: ReturnType<typeof analysisOf>) =>
  findingsOf(analysis, 'english').map(({ text }) => text);

describe('what is said of a chord', () => {
  it('when its root is played elsewhere, then the sentence says so, and of whom', () => {
    const analysis = {
      ...analysisOf(chordOf('Va E3 B3'), {
        limits: [{ ...limit(ROOT_ELSEWHERE, 'note-1', 2), interval: 'M3' }],
      }),
      rootElsewhere: 'C3',
    };
    expect(findingsOf(analysis, 'english')).toEqual([
      {
        lowerId: ROOT_ELSEWHERE,
        upperId: 'note-1',
        share: null,
        semitonesBelow: 2,
        text:
          'With the root C played elsewhere, the violas’ E3, a major third above it, stands 2 semitones under ' +
          'its low limit.',
      },
    ]);
  });

  it('when two sections stand under their limit, then both are named, with interval, size and meeting', () => {
    const analysis = analysisOf(chord, {
      registers: { great: { index: 90, at: 40 } },
      limits: [limit('note-1', 'note-2', 10)],
      pairs: [share('note-1', 'note-2', 0.8, [1, 1, 13.9])],
    });
    expect(texts(analysis)).toEqual([
      'The double basses’ D2 and the cellos’ F2, a minor third, stand 10 semitones under their low limit; ' +
        'their fundamentals stand 14 Hz apart and roughen.',
    ]);
  });

  it('when a divided section stands under its limit, then it is one subject', () => {
    const analysis = analysisOf(chord, { limits: [limit('note-2', 'note-3', 1)] });
    expect(texts(analysis)).toEqual([
      'The cellos’ F2–A2, a major third, stands 1 semitone under its low limit.',
    ]);
  });

  it('when a pair clouds without passing a limit, then its partials are told', () => {
    const analysis = analysisOf(chord, {
      registers: { great: { index: 60, at: 40 } },
      pairs: [share('note-1', 'note-3', 1, [3, 2, 0.36])],
    });
    expect(texts(analysis)).toEqual([
      'The double basses’ D2 and the cellos’ A2, a fifth, cloud the great octave: ' +
        'partial 3 of D2 and partial 2 of A2 stand 0.4 Hz apart and roughen.',
    ]);
  });

  it('when the chord is clear, then no pair is said to cloud it', () => {
    const analysis = analysisOf(chord, {
      registers: { great: { index: 10, at: 40 } },
      pairs: [share('note-1', 'note-3', 1, [3, 2, 0.36])],
    });
    expect(texts(analysis)).toEqual([]);
  });

  it('when there are several, then the largest part comes first and small parts are left out', () => {
    const analysis = analysisOf(chord, {
      registers: { great: { index: 90, at: 40 } },
      limits: [limit('note-2', 'note-3', 5)],
      pairs: [
        share('note-1', 'note-2', 0.3, [1, 1, 14]),
        share('note-2', 'note-3', 0.66, [1, 1, 23]),
        share('note-1', 'note-3', 0.04, [1, 1, 37]),
      ],
    });
    const found = findingsOf(analysis, 'english').map((f) => [
      f.lowerId,
      f.upperId,
      f.share,
      f.semitonesBelow,
    ]);
    expect(found).toEqual([
      ['note-2', 'note-3', 0.66, 5],
      ['note-1', 'note-2', 0.3, null],
    ]);
  });

  it('when notes have German names, then the sentence has them too', () => {
    const german = chordOf('Vc Bb2 B2');
    const analysis = analysisOf(german, { limits: [limit('note-1', 'note-2', 3)] });
    expect(findingsOf(analysis, 'german')[0]?.text).toContain('The cellos’ B2–H2, an augmented unison');
  });

  it('when it is summed up, then the chord’s figure is its cloudiest register’s', () => {
    const analysis = analysisOf(chord, {
      registers: { great: { index: 57.6, at: 40 }, small: { index: 30, at: 50 } },
      limits: [limit('note-1', 'note-2', 10)],
    });
    expect(headlineOf(analysis)).toEqual({
      index: 58,
      uncertainty: 5,
      text: 'cloudiest in the great octave; 1 pair under its low limit',
    });
    expect(changeText(analysis)).toContain('Muddiness 58, cloudiest in the great octave');
  });

  it('when there are no notes, then there is no figure', () => {
    expect(headlineOf(analysisOf(chordOf('')))).toEqual({
      index: null,
      uncertainty: 0,
      text: 'no notes yet',
    });
    expect(changeText(analysisOf(chordOf('')))).toBe('The chord has no notes.');
    expect(overtonesSummary(analysisOf(chordOf('')))).toContain('no notes');
  });

  it('when overtones are told, then voices, partials and their compass are named', () => {
    // A2 is 110 Hz and its third partial 330 Hz.
    expect(overtonesSummary(analysisOf(chordOf('Vc A2')))).toBe('1 voice, 3 partials from 110 Hz to 330 Hz.');
  });

  it('when a note is told, then its frequency and players are', () => {
    expect(factsOf(analysisOf(chordOf('Vc A2')).voices[0])).toBe('110 Hz, 8 players');
  });

  it('when figures are told, then they carry units and sensible digits', () => {
    expect([6.23, 9.96, 110.2].map(hertzText)).toEqual(['6.2 Hz', '10 Hz', '110 Hz']);
    expect([1, 7].map(semitonesText)).toEqual(['1 semitone', '7 semitones']);
    expect(registerName('three-line and up')).toBe('the three-line octave and above');
  });
});

describe('where a note lies', () => {
  const key = { tonic: 'C', mode: 'major' } as const;
  const lies = (section: 'cello' | 'doubleBass', pitch: string) =>
    reachOf({ id: 'note-1', section, pitch }, 'four-string', key, 'english');

  it('when it lies under the lowest string, then that is told', () => {
    // The cello's lowest string is C2.
    expect(lies('cello', 'B1')).toEqual({
      voiceId: 'note-1',
      lying: 'beyond',
      text: 'B1 lies under the lowest note of the cellos, C2.',
    });
    expect(lies('cello', 'C2').text).toBeNull();
  });

  it('when it lies over what anybody reaches, then that is told', () => {
    expect(lies('doubleBass', 'C8').lying).toBe('beyond');
    expect(lies('doubleBass', 'C8').text).toContain('double basses reach');
  });
});
