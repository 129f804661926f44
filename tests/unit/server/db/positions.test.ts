import { expect, test } from 'vitest';
import { readMoment, readPosition, writePosition } from '#server/db/positions';

const ID = 'AAAAAAAAAAAAAAAAAAAAAA';
const refusal = expect.objectContaining({ code: 'input.invalid' });

test('when a place in a list is written, then it is read back in that list and in no other', () => {
  const after = writePosition('title', { value: 'Ébène', id: ID });
  expect(readPosition('title', after)).toEqual({ value: 'Ébène', id: ID });
  expect(() => readPosition('shelf', after)).toThrow(refusal);
});

test('when a place holds what no list has given out, then it is refused and no query is made of it', () => {
  const encoded = (text: string) => Buffer.from(text).toString('base64url');
  for (const text of ['', 'no JSON', '{}', '["shelf", null, "x"]', '["shelf", 1e999, "x"]']) {
    expect(() => readPosition('shelf', encoded(text))).toThrow(refusal);
  }
  expect(() => readPosition('shelf', writePosition('shelf', { value: 1, id: 'é' }))).toThrow(refusal);
});

test('when a list goes by times, then a place without one is refused', () => {
  const at = new Date('2026-11-30T09:00:00.000Z');
  const whole = writePosition('shelf', { value: at.getTime(), id: ID });
  expect(readMoment('shelf', whole)).toEqual({ at, id: ID });
  for (const value of ['yesterday', 9e15]) {
    expect(() => readMoment('shelf', writePosition('shelf', { value, id: ID }))).toThrow(refusal);
  }
});
