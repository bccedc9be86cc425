import { rolesMay } from '../../server/auth/permissions.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import type { Trial } from '../trial/trial.ts';
import type { TrialReader } from '../trial/trial-reader.service.ts';
import { touchBoard } from './run.repository.ts';
import { noteSetBack, readSetBack } from './set-back.repository.ts';

/** Writes down, in the transaction at hand, that the usual settings are on the machine again. */
export async function confirmSetBack(scope: ShopScope, trialId: string): Promise<void> {
  await noteSetBack(scope, trialId, 'done');
  await touchBoard(scope, trialId);
  await recordActivity(scope, { kind: 'trial.set-back', subjectId: trialId, trialId });
}

/** The same by somebody who looked at the machine. Said twice, it is said once. @throws AppError `forbidden`, `not-now` */
export async function confirmSetBackAs(
  scope: ShopScope,
  { trial }: { trial: Trial },
  reader: TrialReader,
): Promise<void> {
  if (!rolesMay(reader.roles, 'trial.run')) throw new AppError('forbidden', { detail: 'lacks trial.run' });
  const standing = await readSetBack(scope, trial.id);
  if (standing === 'not due') throw new AppError('not-now', { detail: 'nobody was asked to set back' });
  if (standing === 'asked') await confirmSetBack(scope, trial.id);
}
