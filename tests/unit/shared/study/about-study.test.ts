import { describe, expect, it } from 'vitest';
import { aboutStudy, keyName } from '#shared/study/about-study';
import { newStudy } from '#shared/study/new-study';

describe('aboutStudy', () => {
  it('when a study is new, then its key, A4 and players are said', () => {
    expect(aboutStudy(newStudy('chord-1'))).toBe('C major · A4 = 440 Hz · 14.12.10.8.6');
  });

  it('when it has a subject and a flat key, then the subject leads and the key has its sign', () => {
    const study = {
      ...newStudy('chord-1'),
      about: 'bars 9–16',
      key: { tonic: 'Bb', mode: 'dorian' } as const,
    };
    expect(aboutStudy(study)).toBe('bars 9–16 · B♭ dorian · A4 = 440 Hz · 14.12.10.8.6');
  });
});

describe('keyName', () => {
  it('when a tonic has a sign, then the key is called with it', () => {
    expect(keyName({ tonic: 'Bb', mode: 'minor' })).toBe('B♭ minor');
  });
});
