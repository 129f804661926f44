import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { newRequestKey } from '@/api/request-key';

describe('newRequestKey', () => {
  it('when keys are made, then each is a random UUID of its own', () => {
    const keys = Array.from({ length: 200 }, newRequestKey);
    expect(keys.every((key) => z.uuidv4().safeParse(key).success)).toBe(true);
    expect(new Set(keys).size).toBe(200);
  });
});
