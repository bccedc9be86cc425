import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import { findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';
import { mayReadPhones, readStop } from './read-stop.service.ts';

/**
 * The number of somebody who was told of a stop, to call them. That it was shown, and to whom, is on record.
 * @throws AppError `forbidden`, `not-now` where the trial is not stopped, `not-found` for anybody else's number
 */
export function readPhoneToCall(
  scope: ShopScope,
  which: { trialId: string; personId: string },
  reader: TrialReader,
): Promise<{ phone: string }> {
  const { trialId, personId } = which;
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, trialId);
    if (!mayReadPhones(reader)) throw new AppError('forbidden', { detail: 'lacks phone.read' });
    if (trial.state !== 'held') throw new AppError('not-now', { detail: 'numbers are shown after a stop' });
    const stop = await readStop(inner, trialId, reader);
    const isTold = stop?.told.some((one) => one.personId === personId) ?? false;
    const phone = isTold ? (await findAddressee(inner, personId))?.phone : null;
    if (!phone) throw new AppError('not-found', { detail: 'no number of that stop' });
    await recordActivity(inner, { kind: 'phone.read', subjectId: personId, trialId });
    return { phone };
  });
}
