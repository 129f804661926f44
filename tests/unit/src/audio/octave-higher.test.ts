import { describe, expect, it } from 'vitest';
import { octaveHigher } from '@/audio/octave-higher';
import { seriesOn, voiceSound } from '../../../support/sounds';

describe('octaveHigher', () => {
  it('when a voice is lifted, then its partials have twice their frequencies and their own levels', () => {
    const voice = voiceSound('low', { midi: 33, partials: seriesOn(55, [3, 0]) });
    const [lifted] = octaveHigher([voice]);
    expect(lifted?.partials).toEqual(seriesOn(110, [3, 0]));
    expect(lifted?.midi).toBe(45);
  });
});
