import { describe, expect, it } from 'vitest';
import { soundsAlike } from '@/audio/alike';
import { liesBelowSmallSpeakers } from '@/audio/small-speakers';
import { seriesOn, voiceSound } from '../../../support/sounds';

const voice = voiceSound('voice', { partials: seriesOn(110, [0, -6]) });

describe('soundsAlike', () => {
  it('when only the name differs, then a voice sounds the same', () => {
    expect(soundsAlike(voice, voiceSound('other', { partials: seriesOn(110, [0, -6]) }))).toBe(true);
  });

  it.each([
    ['a level', { partials: seriesOn(110, [0, -7]) }],
    ['the pitch', { partials: seriesOn(116.5, [0, -6]) }],
    ['the number of partials', { partials: seriesOn(110, [0]) }],
    ['the seat', { section: 'viola' as const, partials: voice.partials }],
    [
      'the stroke',
      { technique: { ...voice.technique, stroke: 'pizzicato' as const }, partials: voice.partials },
    ],
  ])('when %s differs, then it does not', (_, change) => {
    expect(soundsAlike(voice, voiceSound('voice', change))).toBe(false);
  });
});

describe('liesBelowSmallSpeakers', () => {
  it('when a chord stands on D2, then small loudspeakers hardly sound it; on C4 they do', () => {
    expect(liesBelowSmallSpeakers([voiceSound('low', { midi: 38 }), voiceSound('high', { midi: 69 })])).toBe(
      true,
    );
    expect(liesBelowSmallSpeakers([voiceSound('middle', { midi: 60 })])).toBe(false);
    expect(liesBelowSmallSpeakers([])).toBe(false);
  });
});
