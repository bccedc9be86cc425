import { DateTime } from 'luxon';
import { isAtWork } from '../people/at-work.ts';
import type { RunningTrial, RunShift } from './running-trial.ts';

const everyDay = [1, 2, 3, 4, 5, 6, 7];

/** The shift that is on at a moment, in the shop's wall time; undefined between shifts. */
export function shiftAt(trial: RunningTrial, moment: number, timeZone: string): RunShift | undefined {
  return trial.shifts.find(({ fromMinute, toMinute }) => {
    if (fromMinute === null || toMinute === null) return true;
    return isAtWork([{ days: everyDay, fromMinute, toMinute }], moment, timeZone);
  });
}

/** When the first run may go out, in milliseconds UTC; null: as soon as the trial is started. */
export function startMoment({ pace }: RunningTrial, timeZone: string): number | null {
  if (pace.startDate === '') return null;
  const start = DateTime.fromISO(`${pace.startDate}T${pace.startTime || '00:00'}`, { zone: timeZone });
  return start.isValid ? start.toMillis() : null;
}
