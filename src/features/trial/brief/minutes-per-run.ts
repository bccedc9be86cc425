import { planDefaults } from '../finished/start.schema.ts';
import type { FinishedOf } from '../finished.schema.ts';

/** How long one run takes where nobody said so: to set and make it, and to wait for its number. */
export function usualMinutesPerRun(measuring: Pick<FinishedOf<'measuring'>, 'when' | 'minutes'>): number {
  return planDefaults.minutesPerRun + (measuring.when === 'minutes' ? (measuring.minutes ?? 0) : 0);
}
