import { describe, expect, it } from 'vitest';
import { pathOf, queryOf } from '@/api/address';

describe('pathOf', () => {
  it('when a parameter has signs of its own in an address, then they are escaped', () => {
    expect(pathOf('/api/studies/:studyId', { studyId: 'a/b' })).toBe('/api/studies/a%2Fb');
    expect(pathOf('/x/:a/y/:b', { a: '1', b: '?#' })).toBe('/x/1/y/%3F%23');
  });

  it('when a parameter is missing, then it says which', () => {
    expect(() => pathOf('/api/studies/:studyId', {})).toThrow(/studyId/);
  });
});

describe('queryOf', () => {
  it('when something is undefined, then it is left out', () => {
    expect(queryOf({ after: undefined, limit: 20 })).toBe('?limit=20');
    expect(queryOf({ after: undefined })).toBe('');
    expect(queryOf({ after: 'a&b=c' })).toBe('?after=a%26b%3Dc');
  });
});
