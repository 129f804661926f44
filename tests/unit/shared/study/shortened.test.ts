import { expect, it } from 'vitest';
import { shortened } from '#shared/study/shortened';

it('when a text has room, then it stays as it is', () => {
  expect(shortened('Low', 3)).toBe('Low');
  expect(shortened('', 3)).toBe('');
});

it('when a text is too long, then it is cut between characters', () => {
  expect(shortened('Lower', 3)).toBe('Low');
  // U+1F3BB is two UTF-16 units: it stands whole or not at all.
  expect(shortened('Low 🎻', 5)).toBe('Low ');
  expect(shortened('Low 🎻', 6)).toBe('Low 🎻');
  expect(shortened('🎻', 0)).toBe('');
});
