import { describe, expect, it } from 'vitest';
import { CROSSFADE, envelopeOf } from '@/audio/envelope';
import { techniqueSchema } from '#shared/study/study.document';

describe('envelopeOf', () => {
  it('when a note is bowed, then it lasts; when it is plucked, then it begins sooner and decays', () => {
    const bowed = envelopeOf(techniqueSchema.parse({}));
    const plucked = envelopeOf(techniqueSchema.parse({ stroke: 'pizzicato' }));
    expect(bowed.decay).toBeNull();
    expect(plucked.decay).toBeGreaterThan(0);
    expect(plucked.attack).toBeLessThan(bowed.attack);
  });

  it('when a note begins or ends, then it takes a few milliseconds at least: nothing cracks', () => {
    for (const { attack, release } of [
      CROSSFADE,
      envelopeOf(techniqueSchema.parse({ stroke: 'pizzicato' })),
    ]) {
      expect(attack).toBeGreaterThanOrEqual(0.005);
      expect(release).toBeGreaterThanOrEqual(0.005);
    }
  });
});
