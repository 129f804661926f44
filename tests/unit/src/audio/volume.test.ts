import { describe, expect, it } from 'vitest';
import { boundedVolume, meterFill, QUIET_START } from '@/audio/volume';

describe('the volume', () => {
  it('when playback starts, then it is quiet: a fifteenth of full amplitude or less', () => {
    expect(10 ** (QUIET_START / 20)).toBeLessThan(1 / 15);
  });

  it('when a volume lies outside of the control, then the nearest end is taken', () => {
    expect(boundedVolume(6)).toBe(0);
    expect(boundedVolume(-80)).toBe(-60);
    expect(boundedVolume(-18)).toBe(-18);
    expect(boundedVolume(NaN)).toBe(-60);
  });
});

describe('the level meter', () => {
  it('when the peak is halfway down its scale, then it is half full; silence empties it, full scale fills it', () => {
    expect(meterFill(-30)).toBe(0.5);
    expect(meterFill(-Infinity)).toBe(0);
    expect(meterFill(0)).toBe(1);
    expect(meterFill(3)).toBe(1);
  });
});
