import { describe, expect, it } from 'vitest';
import { when } from '#shared/time/when';

const NOW = new Date('2026-03-01T10:12:00Z');
const said = (at: string, zone = 'UTC') => when(new Date(at), NOW, zone);

describe('when', () => {
  it('when less than a minute has passed, or the clocks are unequal, then it is just now', () => {
    expect(said('2026-03-01T10:11:30Z')).toBe('just now');
    expect(said('2026-03-01T10:12:40Z')).toBe('just now');
  });

  it('when less than an hour has passed, then it counts the minutes', () => {
    expect(said('2026-03-01T10:10:30Z')).toBe('a minute ago');
    expect(said('2026-03-01T10:00:00Z')).toBe('12 minutes ago');
  });

  it('when it was today or yesterday where the reader is, then it says so with the time there', () => {
    expect(said('2026-03-01T08:05:00Z')).toBe('today, 08:05');
    expect(said('2026-02-28T18:40:00Z')).toBe('yesterday, 18:40');
    expect(said('2026-02-28T18:40:00Z', 'Asia/Tokyo')).toBe('today, 03:40');
  });

  it('when it was earlier, then it gives the day, and the year where that is another', () => {
    expect(said('2026-02-20T18:40:00Z')).toBe('Fri 20 Feb');
    expect(said('2023-11-04T18:40:00Z')).toBe('4 Nov 2023');
  });
});
