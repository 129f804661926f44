import { expect, test } from 'vitest';
import { MAX_JSON_DEPTH, parseJsonBody } from '#server/http/json-body';

function parse(text: string): unknown {
  return parseJsonBody(Buffer.from(text));
}

function nested(depth: number): string {
  return '['.repeat(depth) + ']'.repeat(depth);
}

test('when a body is JSON in UTF-8, then it is what was sent', () => {
  expect(parse('{"title": "🎻 pp \\u00e9", "chords": [1, null, true]}')).toEqual({
    title: '🎻 pp é',
    chords: [1, null, true],
  });
});

test('when it is nested as deep as is taken, then it is; one deeper, and it is not', () => {
  expect(() => parse(nested(MAX_JSON_DEPTH + 1))).not.toThrow();
  expect(() => parse(nested(MAX_JSON_DEPTH + 2))).toThrow(/nested more than/);
  // MariaDB refuses what is nested 32 deep.
  expect(MAX_JSON_DEPTH + 1).toBeLessThan(32);
});

test('when it is nested a hundred thousand deep, then it is refused and nothing breaks', () => {
  expect(() => parse(nested(100_000))).toThrow(/nested more than/);
});

test.each(['{"__proto__": 1}', '{"a": [{"constructor": 1}]}', '{"prototype": 1}', '{"\\u005f_proto__": 1}'])(
  'when %s names what objects inherit, then it is refused',
  (text) => expect(() => parse(text)).toThrow(/is not taken/),
);

test.each(['"\\ud800"', '"\\udc00\\ud800"', '{"\\ud83d": 1}', '["x\\ud83dx"]'])(
  'when %s holds half a character, then it is refused',
  (text) => expect(() => parse(text)).toThrow(/half of a character/),
);

test('when a pair of surrogates makes a character, then it is one', () => {
  expect(parse('"\\ud83c\\udfbb"')).toBe('🎻');
});
