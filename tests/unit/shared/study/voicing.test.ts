import { describe, expect, it } from 'vitest';
import { emptyChord, newStudy } from '#shared/study/new-study';
import { settingDifferences, voicingsOf } from '#shared/study/voicing';

describe('the chords of a progression as voicings', () => {
  it('when a chord has no name, then its place names it, and a link can name where it is kept', () => {
    const study = {
      ...newStudy('chord-1'),
      chords: [emptyChord('chord-1'), { ...emptyChord('chord-2'), name: 'close' }],
    };
    const voicings = voicingsOf(study, { studyId: 'study-1', number: 3, from: 'Ferry' });
    expect(voicings.map(({ name, from }) => [name, from])).toEqual([
      ['Chord 1', 'Ferry'],
      ['close', 'Ferry'],
    ]);
    expect(voicings[1]?.place).toEqual({ studyId: 'study-1', number: 3, chordId: 'chord-2' });
  });

  it('when two stand under other settings, then those are named', () => {
    const study = newStudy('chord-1');
    const ensemble = {
      players: { ...study.ensemble.players, cello: 3 },
      bass: 'five-string' as const,
    };
    expect(settingDifferences(study, study)).toEqual([]);
    expect(settingDifferences(study, { ...study, a4Hz: 442, intonation: 'pure', ensemble })).toEqual([
      ...['A4', 'intonation', 'players', 'double basses'],
    ]);
  });
});
