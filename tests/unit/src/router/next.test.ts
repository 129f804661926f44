import { describe, expect, it } from 'vitest';
import { nextPath } from '@/router/next';

const HERE = 'https://siltline.example';

describe('nextPath', () => {
  it.each([
    ['/studies?x=1', '/studies?x=1'],
    ['/studies/abc#y', '/studies/abc#y'],
    ['studies', '/studies'],
    [`${HERE}/mail`, '/mail'],
    ['/a/../b', '/b'],
    // The URL standard takes a scheme without slashes, if it is this site's own, as a relative address.
    ['https:e.test', '/e.test'],
  ])('when it is %j, an address of this site, then one goes there', (wanted, path) => {
    expect(nextPath(wanted, HERE)).toBe(path);
  });

  it.each([
    '//e.test',
    '/\\e.test',
    '\\\\e.test',
    '/\t/e.test',
    '/\n/e.test',
    ' //e.test',
    'https://e.test/',
    'javascript:alert(1)',
    'java\tscript:alert(1)',
    'data:text/html,x',
    'http://siltline.example/',
    'https://siltline.example@e.test/',
    '/.//e.test',
    'https://[',
  ])('when it is %j, an address of another site, then it is dropped', (wanted) => {
    expect(nextPath(wanted, HERE)).toBeNull();
  });

  it.each([undefined, null, 7, ['/a', '/b']])('when it is %j, then it is dropped', (wanted) => {
    expect(nextPath(wanted, HERE)).toBeNull();
  });
});
