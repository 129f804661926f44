import { describe, expect, it } from 'vitest';
import { heardNumbers } from '#shared/voicing/heard';
import { apartText, seriesMeetings, seriesText } from '#shared/voicing/series-meetings';
import { soundsOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

describe('what the partials of a note meet', () => {
  it('when a fifth sounds, then partial 3 of the lower meets partial 2 of the upper, 0.37 Hz apart', () => {
    // In equal temperament the fifth is 2 cents narrow: 330.00 and 329.63 Hz.
    const voices = soundsOf(chordOf('Vc A2 E3'));
    const [meeting] = seriesMeetings(voices, 'note-1').filter(({ n }) => n === 3);
    expect(meeting).toMatchObject({ otherId: 'note-2', otherN: 2 });
    expect(meeting?.differenceHz).toBeCloseTo(0.37, 2);
    expect(apartText(meeting?.differenceHz ?? NaN)).toBe('together');
    expect(seriesText(voices, 'note-1', 'english')).toContain(
      'Partial 3, 330 Hz, meets partial 2 of the cellos’ E3, together.',
    );
  });

  it('when notes lie far apart, alone, or are not there, then nothing meets', () => {
    expect(seriesMeetings(soundsOf(chordOf('DB E1, Vn1 E6'), 2), 'note-1')).toEqual([]);
    expect(seriesMeetings(soundsOf(chordOf('Vc A2')), 'note-1')).toEqual([]);
    expect(seriesMeetings(soundsOf(chordOf('Vc A2')), 'nobody')).toEqual([]);
  });

  it('when a partial stands more than 20 dB under another in its band, then it is masked', () => {
    const [low, high] = soundsOf(chordOf('Vc A3, Va A3'), 1);
    if (!low || !high) throw new Error('two notes were typed');
    const quiet = { ...high, partials: high.partials.map((partial) => ({ ...partial, levelDb: -21 })) };
    const heard = heardNumbers([low, quiet]);
    expect(heard.get(low.id)).toEqual(new Set([1]));
    expect(heard.get(quiet.id)).toEqual(new Set());
  });
});
