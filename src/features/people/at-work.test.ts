import { DateTime } from 'luxon';
import { describe, expect, it } from 'vitest';
import { isAtWork, nextAtWork } from './at-work.ts';
import type { WorkSpan } from './work-hours.ts';

const zone = 'America/New_York';
const day: WorkSpan = { days: [1, 2, 3, 4, 5], fromMinute: 360, toMinute: 840 };
const night: WorkSpan = { days: [5], fromMinute: 22 * 60, toMinute: 6 * 60 };

function at(iso: string): number {
  return DateTime.fromISO(iso, { zone }).toMillis();
}

describe('work hours', () => {
  // 2026-12-04 is a Friday.
  it.each([
    ['2026-12-04T05:59', false],
    ['2026-12-04T06:00', true],
    ['2026-12-04T13:59', true],
    ['2026-12-04T14:00', false],
    ['2026-12-05T07:00', false],
  ])('of a day shift at %s: %s', (iso, expected) => {
    expect(isAtWork([day], at(iso), zone)).toBe(expected);
  });

  it.each([
    ['2026-12-04T21:59', false],
    ['2026-12-04T22:00', true],
    ['2026-12-05T05:59', true],
    ['2026-12-05T06:00', false],
    // The night belongs to the day it starts on: Thursday's night is not worked.
    ['2026-12-04T03:00', false],
    ['2026-12-05T23:00', false],
  ])('of a night shift that starts on Friday at %s: %s', (iso, expected) => {
    expect(isAtWork([night], at(iso), zone)).toBe(expected);
  });

  it('of a Sunday night reach into Monday', () => {
    expect(isAtWork([{ ...night, days: [7] }], at('2026-12-07T02:00'), zone)).toBe(true);
  });

  it('with the same start and end go round the clock', () => {
    const round: WorkSpan = { days: [1], fromMinute: 360, toMinute: 360 };
    expect(isAtWork([round], at('2026-12-07T06:00'), zone)).toBe(true);
    expect(isAtWork([round], at('2026-12-08T05:59'), zone)).toBe(true);
    expect(isAtWork([round], at('2026-12-08T06:00'), zone)).toBe(false);
  });

  it('are wall hours on both changes of clock', () => {
    const everyNight: WorkSpan = { ...night, days: [1, 2, 3, 4, 5, 6, 7] };
    for (const iso of ['2026-03-08T03:30', '2026-11-01T01:30']) {
      expect(isAtWork([everyNight], at(iso), zone)).toBe(true);
    }
    // 02:30 does not exist on that morning; the shift then starts an hour later.
    const early: WorkSpan = { days: [7], fromMinute: 150, toMinute: 600 };
    expect(nextAtWork([early], at('2026-03-08T01:00'), zone)).toBe(at('2026-03-08T03:30'));
  });
});

describe('the next moment at work', () => {
  it('is now while at work', () => {
    expect(nextAtWork([day], at('2026-12-04T10:00'), zone)).toBe(at('2026-12-04T10:00'));
  });

  it('is the next start, over a weekend too', () => {
    expect(nextAtWork([day], at('2026-12-04T14:00'), zone)).toBe(at('2026-12-07T06:00'));
    expect(nextAtWork([day, night], at('2026-12-04T14:00'), zone)).toBe(at('2026-12-04T22:00'));
  });

  it('is a week ahead for a span just missed', () => {
    const monday: WorkSpan = { days: [1], fromMinute: 360, toMinute: 400 };
    expect(nextAtWork([monday], at('2026-12-07T06:40'), zone)).toBe(at('2026-12-14T06:00'));
  });

  it('is never without hours', () => {
    expect(nextAtWork([], at('2026-12-04T14:00'), zone)).toBeNull();
  });
});
