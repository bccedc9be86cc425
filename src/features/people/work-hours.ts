import { z } from 'zod';
import './schema-settings.ts';

const minutesInDay = 24 * 60;
/**
 * A span of work: on which days it starts (1 Monday to 7 Sunday) and its wall minutes after midnight. One that ends at or
 * before its start runs into the next day: 22:00 to 06:00 is a night shift, 06:00 to 06:00 a whole day round.
 */
export const workSpanSchema = z.strictObject({
  days: z
    .array(z.number().int().min(1).max(7))
    .min(1, { error: 'missing' })
    .max(7)
    .transform((days) => [...new Set(days)].sort((a, b) => a - b)),
  fromMinute: z
    .number()
    .int()
    .min(0)
    .max(minutesInDay - 1),
  toMinute: z.number().int().min(0).max(minutesInDay),
});
export type WorkSpan = z.output<typeof workSpanSchema>;

/** When a person may be texted. No span at all means never. */
export const workSpansSchema = z.array(workSpanSchema).max(14);

/** As it stands in `people.work_hours`. */
export const storedWorkHoursSchema = z.object({ v: z.literal(1), spans: workSpansSchema });

/** Monday to Friday, 06:00 to 14:00: what a new person starts with until somebody says better. */
export const usualWorkSpans: readonly WorkSpan[] = [
  { days: [1, 2, 3, 4, 5], fromMinute: 6 * 60, toMinute: 14 * 60 },
];

export function storeWorkHours(spans: readonly WorkSpan[]): string {
  return JSON.stringify({ v: 1, spans });
}

/** A time of day as people type it (`06:00`, `6.30`, `0600`, `6`) in minutes after midnight; null for anything else. */
export function parseWallTime(text: string): number | null {
  const found = /^([01]?\d|2[0-3])(?:[:.]?([0-5]\d))?$/.exec(text.trim());
  return found ? Number(found[1]) * 60 + Number(found[2] ?? 0) : null;
}

/** Minutes after midnight as `06:00`. */
export function formatWallTime(minute: number): string {
  const two = (part: number) => String(part).padStart(2, '0');
  return `${two(Math.floor(minute / 60))}:${two(minute % 60)}`;
}
