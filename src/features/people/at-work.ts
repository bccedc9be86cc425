import { DateTime } from 'luxon';
import type { WorkSpan } from './work-hours.ts';

function crossesMidnight({ fromMinute, toMinute }: WorkSpan): boolean {
  return toMinute <= fromMinute;
}

/**
 * Whether a person is at work at a moment.
 * @param moment milliseconds UTC
 * @param timeZone the shop's IANA zone: hours are wall hours, on days of changed clocks too
 */
export function isAtWork(spans: readonly WorkSpan[], moment: number, timeZone: string): boolean {
  const wall = DateTime.fromMillis(moment, { zone: timeZone });
  const minute = wall.hour * 60 + wall.minute;
  const today = wall.weekday;
  const yesterday = today === 1 ? 7 : today - 1;
  return spans.some((span) => {
    const begun = span.days.includes(today) && minute >= span.fromMinute;
    if (!crossesMidnight(span)) return begun && minute < span.toMinute;
    return begun || (span.days.includes(yesterday) && minute < span.toMinute);
  });
}

/**
 * The first moment, now or later, at which a person is at work.
 * @returns milliseconds UTC, or null where the hours hold no span
 */
export function nextAtWork(spans: readonly WorkSpan[], moment: number, timeZone: string): number | null {
  if (isAtWork(spans, moment, timeZone)) return moment;
  const midnight = DateTime.fromMillis(moment, { zone: timeZone }).startOf('day');
  const starts: number[] = [];
  for (let ahead = 0; ahead <= 7; ahead += 1) {
    const day = midnight.plus({ days: ahead });
    for (const span of spans) {
      if (!span.days.includes(day.weekday)) continue;
      const { fromMinute } = span;
      // `set` reads wall time, so a start inside the skipped hour of spring moves to the hour after it.
      const start = day.set({ hour: Math.floor(fromMinute / 60), minute: fromMinute % 60 }).toMillis();
      if (start >= moment) starts.push(start);
    }
  }
  return starts.length === 0 ? null : Math.min(...starts);
}
