import { describe, expect, it } from 'vitest';
import { CROSSFADE, envelopeOf } from '@/audio/envelope';
import { techniqueSchema } from '#shared/study/study.document';

const ORDINARY = techniqueSchema.parse({});
const PIZZICATO = techniqueSchema.parse({ stroke: 'pizzicato' });
const [E1, A4, E6] = [28, 69, 88];

describe('envelopeOf', () => {
  it('when a note is bowed, then it lasts; when it is plucked, then it begins sooner and decays', () => {
    const bowed = envelopeOf(ORDINARY, A4);
    const plucked = envelopeOf(PIZZICATO, A4);
    expect(bowed.decay).toBeNull();
    expect(plucked.decay).toBeGreaterThan(0);
    expect(plucked.attack).toBeLessThan(bowed.attack);
  });

  it('when a note lies lower, then the bow takes hold more slowly and a plucked string sounds longer', () => {
    expect(envelopeOf(ORDINARY, E1).attack).toBeGreaterThan(envelopeOf(ORDINARY, A4).attack);
    expect(envelopeOf(PIZZICATO, E1).decay).toBeGreaterThan(envelopeOf(PIZZICATO, A4).decay ?? Infinity);
  });

  it('when the lowest E is bowed, then its attack is the one that the example gives', () => {
    expect(envelopeOf(ORDINARY, E1).attack).toBe(0.13);
  });

  it('when a note begins or ends, then it takes a few milliseconds at least: nothing cracks', () => {
    for (const { attack, release } of [
      CROSSFADE,
      ...[E1, A4, E6].flatMap((midi) => [envelopeOf(PIZZICATO, midi), envelopeOf(ORDINARY, midi)]),
    ]) {
      expect(attack).toBeGreaterThanOrEqual(0.005);
      expect(release).toBeGreaterThanOrEqual(0.005);
    }
  });
});
