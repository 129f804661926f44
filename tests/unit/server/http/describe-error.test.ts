import { DrizzleQueryError } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { describeError } from '#server/http/describe-error';

const SECRET = 'ada@people.example';

function driverError(): Error {
  const message = `Duplicate entry '${SECRET}' for key 'email'`;
  return Object.assign(new Error(message), { code: 'ER_DUP_ENTRY', errno: 1062, sqlState: '23000' });
}

test.each([
  ['the driver', driverError()],
  ['Drizzle around the driver', new DrizzleQueryError('insert into accounts', [SECRET], driverError())],
  ['Drizzle alone', new DrizzleQueryError('insert into accounts', [SECRET])],
])('when %s fails, then no bound value is told', (_what, error) => {
  expect(error.message).toContain(SECRET);
  expect(JSON.stringify(describeError(error))).not.toContain(SECRET);
});

test('when the driver failed, then its code is told', () => {
  const error = new DrizzleQueryError('insert', [SECRET], driverError());
  expect(describeError(error)).toMatchObject({ type: 'DatabaseFault', code: 'ER_DUP_ENTRY', errno: 1062 });
});

test('when something else failed, then its message and its places are told', () => {
  const described = describeError(new RangeError('octave 12 is out of range'));
  expect(described).toMatchObject({ type: 'RangeError', message: 'octave 12 is out of range' });
  expect(described.stack[0]).toMatch(/^at /);
});
