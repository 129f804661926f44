import { describe, expect, it } from 'vitest';
import { SEATS } from '@/audio/seats';
import { levelOf } from '@/audio/levels';
import { SECTIONS } from '#shared/strings/sections';

/** Equal-power panning of a mono sound, Web Audio API, StereoPannerNode. */
function channelsOf(pan: number): readonly [number, number] {
  const angle = ((pan + 1) * Math.PI) / 4;
  return [Math.cos(angle), Math.sin(angle)];
}

describe('SEATS', () => {
  it('when the sections are read from the top of the score, then they sit from left to right', () => {
    const seats = SECTIONS.map((section) => SEATS[section]);
    expect(seats).toEqual([...seats].sort((a, b) => a - b));
    expect(Math.min(...seats)).toBe(-Math.max(...seats));
  });

  it('when both channels are summed, then no section loses more than 1 dB against the middle', () => {
    const summed = (pan: number) => channelsOf(pan).reduce((sum, channel) => sum + channel, 0);
    for (const section of SECTIONS) {
      expect(levelOf(summed(0)) - levelOf(summed(SEATS[section]))).toBeLessThan(1);
    }
  });
});
