import type { Translate } from '../../i18n/translator.ts';
import { formatWallTime, type WorkSpan } from './work-hours.ts';

type Day = '1' | '2' | '3' | '4' | '5' | '6' | '7';

function describeDays(days: readonly number[], t: Translate): string {
  if (days.length === 7) return t('people:everyDay');
  const nameOf = (day: number) => t(`people:day.${String(day) as Day}`);
  const [first, last] = [days[0], days.at(-1)];
  const isRow = first !== undefined && last !== undefined && last - first === days.length - 1;
  if (isRow && days.length > 2) return `${nameOf(first)}\u2013${nameOf(last)}`;
  return days.map(nameOf).join(', ');
}

/** Work hours, a line for each shift, such as "Mon–Fri 06:00–14:00". */
export function describeHours(spans: readonly WorkSpan[], t: Translate): string[] {
  if (spans.length === 0) return [t('people:noHours')];
  return spans.map(({ days, fromMinute, toMinute }) => {
    const times = `${formatWallTime(fromMinute)}\u2013${formatWallTime(toMinute % 1440)}`;
    return `${describeDays(days, t)} ${times}`;
  });
}
