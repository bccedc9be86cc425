import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { flag, foldForSearch, jsonColumn, likePattern, moment } from './columns.ts';

describe('columns', () => {
  it('read alike from both databases', () => {
    expect([0, 1, true, false].map((value) => flag.parse(value))).toEqual([false, true, true, false]);
    expect([1_796_000_000_000, '1796000000000'].map((value) => moment.parse(value))).toEqual([
      1_796_000_000_000, 1_796_000_000_000,
    ]);
  });

  it('check stored JSON', () => {
    const column = jsonColumn(z.object({ v: z.literal(1) }));
    expect(column.parse('{"v":1}')).toEqual({ v: 1 });
    expect(column.safeParse('{"v":2}').success).toBe(false);
    expect(column.safeParse('{').success).toBe(false);
  });

  it('fold names for search, with letters that do not come apart', () => {
    expect(foldForSearch('  Łucja  Nguyễn Đặng ')).toBe('lucja nguyen dang');
    expect(likePattern('50%_\\')).toBe('%50\\%\\_\\\\%');
  });
});
