import { describe, expect, it } from 'vitest';
import { balanceSentences } from '#shared/voicing/balance.sentences';
import { characterFigures } from '#shared/voicing/character.sentences';
import { analyseChord, explainRegister } from '#shared/voicing/analysis';
import { registerFindings } from '#shared/voicing/register.sentences';
import { EVEN_SETTINGS, voicing } from '../../../support/voicings';

const key = { tonic: 'F', mode: 'major' } as const;

describe('the figures of a chord in words', () => {
  const figures = characterFigures(
    {
      ...{ weight: 46.4, spread: 28, openness: 7.07, brightnessHz: 418.9 },
      fundamental: { frequencyHz: 29.1, multiples: [2, 3, 2] },
      root: { root: 10, rootSupport: 0.29, bassSupport: 0.12, ambiguity: 1.87 },
    },
    1,
    key,
    'english',
  );
  const figure = (name: string) => figures.find((found) => found.name === name);

  it('when a figure is shown, then it has its unit and sensible digits', () => {
    expect(figures.map(({ value }) => value)).toEqual([
      ...['1 pair', 'B♭2', '28 semitones', '7.1 semitones', '419 Hz', 'B♭, 29 %', '29 Hz'],
    ]);
  });

  it('when a figure is asked about, then it says what it is', () => {
    expect(figures.every(({ definition }) => definition.endsWith('.'))).toBe(true);
    expect(figure('Root clarity')?.definition).toContain('The bass note has 12 %');
    expect(figure('Common fundamental')?.definition).toContain('2 : 3. It lies under about 30 Hz');
  });

  it('when a chord has no notes, then nothing is made up', () => {
    const empty = { weight: null, openness: null, brightnessHz: null, fundamental: null, root: null };
    const values = characterFigures({ ...empty, spread: 0 }, 0, key, 'english').map(({ value }) => value);
    expect(values).toEqual(['0 pairs', 'none', '0 semitones', 'none', 'none', 'none', 'none']);
  });
});

describe('the balance of a chord in words', () => {
  const sounds = [
    { id: 'low', section: 'viola', pitch: 'G3', players: 10 },
    { id: 'top', section: 'violin1', pitch: 'Bb4', players: 1 },
  ] as const;
  const even = { players: 8, levelDb: 0, standing: 'even', ids: [] } as const;

  it('when a line is covered and a tone is thin, then both are said', () => {
    const balance = {
      voices: [
        { id: 'low', heard: 0.32, covered: true },
        { id: 'top', heard: 1, covered: false },
      ],
      tones: [
        { ...even, tone: 'G' },
        { ...even, tone: 'Bb', players: 1, levelDb: -11.2, standing: 'thin' as const },
      ],
    };
    expect(balanceSentences(balance, sounds, 'english')).toEqual([
      'The violas’ G3 is covered: 32 % of it is heard.',
      'B♭ is thin: 11 dB under the mean of the other tones, with 1 player.',
    ]);
  });

  it('when all is even, then that is said, and of a single note nothing', () => {
    expect(balanceSentences({ voices: [], tones: [] }, sounds, 'english')).toHaveLength(1);
    expect(balanceSentences({ voices: [], tones: [] }, sounds.slice(0, 1), 'english')).toEqual([]);
  });
});

describe('what clouds one register', () => {
  it('when the great octave is asked about, then only what meets there is told', () => {
    const chord = voicing('C2 E2 A5 B5');
    const pairs = explainRegister(chord, EVEN_SETTINGS, 'great');
    const found = registerFindings(analyseChord(chord, EVEN_SETTINGS), 'great', pairs, 'english');
    expect(found.map(({ lowerId, upperId }) => [lowerId, upperId])).toEqual([['voice-0', 'voice-1']]);
  });
});
