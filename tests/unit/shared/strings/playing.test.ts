import { describe, expect, it } from 'vitest';
import { openStringOffers } from '#shared/strings/open-string-offers';
import { playingFindings, stringsFor } from '#shared/strings/playing';
import { DEFAULT_ENSEMBLE, techniqueSchema } from '#shared/study/study.document';
import { playingRemarks, playingText, signedCents } from '#shared/voicing/playing.sentences';
import { chordOf } from '../../../support/typed-chords';

const by = {
  ensemble: DEFAULT_ENSEMBLE,
  a4Hz: 440,
  key: { tonic: 'C', mode: 'major' },
  naming: 'english',
} as const;
const remarks = (line: string) => playingRemarks(chordOf(line), by).map(({ grade, text }) => [grade, text]);

describe('how a chord is played', () => {
  it('when all lies well, then nothing is said', () => {
    expect(remarks('Vc C3 G3, Va E4')).toEqual([]);
    expect(playingFindings(chordOf('Vc C3'), DEFAULT_ENSEMBLE, 440).map(({ grade }) => grade)).toEqual([
      'easy',
    ]);
  });

  it('when a note lies under the lowest string, then it is not playable, with the reason', () => {
    expect(remarks('Va B2')).toEqual([
      ['not playable', 'Not playable: the violas’ B2, below the lowest note of the violas.'],
    ]);
  });

  it('when two notes of a stop lie on one string, then the stop is not playable', () => {
    // Both under the open D: only the C and G strings have one of them each, and C2 none but its own.
    expect(remarks('Vc C2+D2')).toMatchObject([['not playable', expect.stringContaining('as a stop')]]);
  });

  it('when a section is divided into more lines than it has players, then that is said', () => {
    const ensemble = { ...DEFAULT_ENSEMBLE, players: { ...DEFAULT_ENSEMBLE.players, viola: 1 } };
    expect(playingRemarks(chordOf('Va C4 E4'), { ...by, ensemble }).map(({ text }) => text)).toEqual([
      'Not playable: the violas divided, 2 players are needed and the section has 1.',
    ]);
  });

  it('when a note can be played on several strings, then they are named from the highest', () => {
    const chord = chordOf('Vc D3');
    const [voice] = chord.voices;
    if (!voice) throw new Error('a note was typed');
    expect(stringsFor(voice, 'four-string').map(({ number }) => number)).toEqual([2, 3, 4]);
    expect(playingText(voice, chord, by)).toBe('easy, on string II, III or IV');
  });

  it('when a harmonic is asked for, then where it is touched is said', () => {
    const chord = chordOf('Vn1 E6');
    const harmonic = techniqueSchema.parse({ harmonic: 'artificial' });
    const voices = chord.voices.map((voice) => ({ ...voice, technique: harmonic }));
    const [voice] = voices;
    if (!voice) throw new Error('a note was typed');
    expect(playingText(voice, { voices }, by)).toBe('easy, stopped at E4 and touched at A4');
  });
});

describe('what the open strings offer', () => {
  it('when a chord has a C sharp, then the fifth partial of the cellos’ A string sounds it, 14 cents low', () => {
    // The fifth partial lies 13.7 cents under the equal-tempered key.
    const offer = openStringOffers([73], 'cello', 'four-string', 440).find(
      ({ partial, string }) => partial === 5 && string === 1,
    );
    expect(offer).toMatchObject({ midi: 85, inChord: false });
    expect(signedCents(offer?.centsOff ?? NaN)).toBe('−14 cents');
  });

  it('when the pitch itself is in the chord, then that is said; a chord of none gets nothing', () => {
    expect(
      openStringOffers([69], 'cello', 'four-string', 440).filter(({ inChord }) => inChord),
    ).toMatchObject([
      { partial: 2, string: 1 },
      { partial: 3, string: 2 },
    ]);
    expect(openStringOffers([], 'viola', 'four-string', 440)).toEqual([]);
  });
});
