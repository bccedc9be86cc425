import { expect, it } from 'vitest';
import { idSchema, newId } from './ids.ts';

it('makes ids that sort as they were made, within one millisecond too', () => {
  const ids = Array.from({ length: 5_000 }, newId);
  expect([...ids].sort()).toEqual(ids);
  expect(new Set(ids).size).toBe(ids.length);
  expect(idSchema.safeParse(ids[0]).success).toBe(true);
});
