import { describe, expect, it } from 'vitest';
import { retryDelayMs } from '@/stores/retry-delay';

describe('retryDelayMs', () => {
  it('when failures follow each other, then each wait is twice the last, a quarter of a minute at most', () => {
    expect([1, 2, 3].map(retryDelayMs)).toEqual([2000, 4000, 8000]);
    expect(retryDelayMs(30)).toBe(15_000);
  });
});
