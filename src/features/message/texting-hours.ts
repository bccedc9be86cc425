import { isAtWork, nextAtWork } from '../people/at-work.ts';
import type { WorkSpan } from '../people/work-hours.ts';

export interface TextingHours {
  /** The person's own hours. */
  spans: readonly WorkSpan[];
  /** The shop's quiet hours, minutes after midnight; null where it has none. */
  quiet: { fromMinute: number; toMinute: number } | null;
  /** The shop's IANA zone. */
  timeZone: string;
}

const minuteMilliseconds = 60_000;
const everyDay = [1, 2, 3, 4, 5, 6, 7];
/** A week of quiet hours between shifts at most: beyond that no moment will ever fit. */
const mostSteps = 16;

/**
 * The first moment, now or later, at which a person may be texted: at work, and not in the shop's quiet hours.
 * @param moment milliseconds UTC
 * @returns milliseconds UTC, or null where the hours never meet
 */
export function nextTextingMoment(hours: TextingHours, moment: number): number | null {
  const { spans, quiet, timeZone } = hours;
  let at: number | null = moment;
  for (let step = 0; step < mostSteps; step += 1) {
    at = nextAtWork(spans, at, timeZone);
    if (at === null || quiet === null || quiet.fromMinute === quiet.toMinute) return at;
    const quietSpan = { days: everyDay, ...quiet };
    if (!isAtWork([quietSpan], at, timeZone)) return at;
    // The loud part of the day is the quiet one turned round.
    const loudSpan = { days: everyDay, fromMinute: quiet.toMinute, toMinute: quiet.fromMinute };
    at = nextAtWork([loudSpan], at + minuteMilliseconds, timeZone);
    if (at === null) return null;
  }
  return null;
}
