import { bodyLimits } from '../../server/limits.ts';
import { addPhoto } from '../run/photo.service.ts';
import { listRuns } from '../run/run.repository.ts';
import { openPhone, type PhoneVisit } from './phone-link.service.ts';
import type { PhoneOutcome } from './phone-outcome.ts';

const outcomes = {
  kept: 'photo',
  already: 'photo',
  'not a picture': 'photoRefused',
  enough: 'photoEnough',
} as const;

/**
 * Keeps a picture that was sent from a phone page, with a run that this person has or had.
 * @throws AppError `gone`, `too-many`
 */
export async function addPhonePhoto(visit: PhoneVisit, runId: string, file: unknown): Promise<PhoneOutcome> {
  const { scope, personId, trialId } = await openPhone(visit);
  const run = (await listRuns(scope, trialId)).find(({ id }) => id === runId);
  if (!run || (run.personId !== personId && run.measurerId !== personId)) return 'behind';
  if (!(file instanceof File) || file.size === 0 || file.size > bodyLimits.photo) return 'photoRefused';
  const bytes = new Uint8Array(await file.arrayBuffer());
  return outcomes[await addPhoto(scope, { runId, bytes, source: 'phone page', sentBy: personId })];
}
