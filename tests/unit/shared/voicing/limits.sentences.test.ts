import { describe, expect, it } from 'vitest';
import { limitInForce, limitText } from '#shared/voicing/limits.sentences';

const key = { tonic: 'F', mode: 'major' } as const;
const third = { interval: 'M3', semitones: 4, exact: null } as const;
// The major third's printed limit is B♭2; F2 is made up.
const [bFlat2, f2] = [46, 41];

describe('the limits of an interval in words', () => {
  it('when chart and model both have one, then they stand side by side', () => {
    expect(limitText({ ...third, chart: bFlat2, model: f2 }, key, 'english')).toBe(
      'Chart: not below B♭2. For these sections the model puts it at F2.',
    );
  });

  it('when one of them has none, then that is said', () => {
    expect(limitText({ ...third, chart: null, model: f2 }, key, 'english')).toContain('Chart: no limit');
    expect(limitText({ ...third, chart: bFlat2, model: null }, key, 'english')).toContain('model finds none');
  });

  it('when the study has a limit of its own, then it stands in the place of the chart’s', () => {
    const own = [{ semitones: 4, lowest: 'C3' }];
    const limit = { ...third, chart: bFlat2, model: f2 };
    expect(limitText(limit, key, 'english', own)).toContain('Own limits: not below C3.');
    expect(limitText(limit, key, 'english', [])).toContain('Own limits: no limit for this interval.');
    expect(limitInForce(limit, own).chart).toBe(48);
    expect(limitInForce(limit, null).chart).toBe(bFlat2);
  });

  it('when the interval is in neither, then that is said', () => {
    expect(limitText(undefined, key, 'english')).toBe('The chart has no limit for this interval.');
  });
});
