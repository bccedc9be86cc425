import { describe, expect, it } from 'vitest';
import { formatWallTime, parseWallTime, storedWorkHoursSchema, storeWorkHours } from './work-hours.ts';

describe('times of day', () => {
  it.each([
    ['06:00', 360],
    ['6:05', 365],
    ['23:59', 1439],
    ['24:00', null],
    ['6', 360],
    ['0600', 360],
    ['630', 390],
    ['22.30', 1350],
    ['6:5', null],
    ['6 pm', null],
    ['', null],
  ])('"%s" reads as %s', (text, minute) => {
    expect(parseWallTime(text)).toBe(minute);
  });

  it('are written with two figures each', () => {
    expect(formatWallTime(365)).toBe('06:05');
  });
});

describe('stored work hours', () => {
  it('read back as they were, each day once and in order', () => {
    const text = storeWorkHours([{ days: [5, 1, 1], fromMinute: 1320, toMinute: 360 }]);
    expect(storedWorkHoursSchema.parse(JSON.parse(text)).spans).toEqual([
      { days: [1, 5], fromMinute: 1320, toMinute: 360 },
    ]);
  });
});
