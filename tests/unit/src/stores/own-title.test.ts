import { describe, expect, it } from 'vitest';
import { MAX_TITLE } from '#shared/study/study.document';
import { ownTitle } from '@/stores/study-conflict';

describe('ownTitle', () => {
  it('when the title is short, then it says whose copy it is', () => {
    expect(ownTitle('Ebb')).toBe('Ebb (mine)');
  });

  it('when the title is as long as it may be and full of emoji, then none is cut in two', () => {
    const title = ownTitle('a' + '🎻'.repeat(MAX_TITLE));
    expect(title.length).toBeLessThanOrEqual(MAX_TITLE);
    expect(encodeURIComponent(title)).toContain('%F0%9F%8E%BB%20(mine)');
    expect(title.endsWith('🎻 (mine)')).toBe(true);
  });
});
