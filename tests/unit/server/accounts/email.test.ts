import { expect, test } from 'vitest';
import { normaliseEmail } from '#server/accounts/email';

test('when two spellings are of one address, then they become the same', () => {
  // U+00E9 and e + U+0301 are canonically equivalent: Unicode Standard Annex #15.
  expect(normaliseEmail('caf\u00e9@x.example')).toBe(normaliseEmail('cafe\u0301@x.example'));
  expect(normaliseEmail(' A@X.Example\t')).toBe('a@x.example');
});

test('when two addresses differ by an accent, then they stay two', () => {
  expect(normaliseEmail('á@x.example')).not.toBe(normaliseEmail('a@x.example'));
});
