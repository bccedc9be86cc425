import type { Fact } from '../facts.ts';
import { coachRange } from './coach-ranges.ts';
import { coachResults } from './coach-results.ts';
import { coachSettings } from './coach-settings.ts';
import type { CoachDraft } from './draft.ts';

/**
 * What is worth saying about answers while they are being given: setting by setting, then about the settings together, then about the results.
 *
 * Never throws: what is missing or not yet a number is passed over in silence. A plan may still be refused for what is said here.
 */
export function coach(draft: CoachDraft): Fact[] {
  return [...(draft.factors ?? []).flatMap(coachRange), ...coachSettings(draft), ...coachResults(draft)];
}
