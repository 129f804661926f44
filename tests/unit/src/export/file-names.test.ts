import { describe, expect, it } from 'vitest';
import { fileName } from '@/export/file-names';

describe('a file name', () => {
  it('when it is made of a title and a chord, then its example holds', () => {
    expect(fileName(['The ferry / dusk', 'D♭maj13'], 'svg')).toBe('the-ferry-dusk-d♭maj13.svg');
  });

  it.each([
    ['../../etc/passwd', 'etc-passwd.csv'],
    ['..', 'siltline.csv'],
    ['CON', 'study-con.csv'],
    ['a\u0000b\r\nc', 'a-b-c.csv'],
    ['-rf', 'rf.csv'],
    ['\u202Egnp.exe', 'gnp-exe.csv'],
    ['$(touch x)', 'touch-x.csv'],
    ['   ', 'siltline.csv'],
    ['音楽', '音楽.csv'],
  ])('when the title is %j, then it is %s', (title, name) => {
    expect(fileName([title], 'csv')).toBe(name);
  });

  it('when the title is very long, then it is cut', () => {
    expect(fileName(['x'.repeat(500)], 'png').length).toBeLessThan(80);
  });
});
