import type { ShopScope } from '../../server/db/scope.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import { takesTexts } from './run-people.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { noteSetBack } from './set-back.repository.ts';
import { tell } from './tell.service.ts';

/** Tells those who make runs that a trial goes on after a stop for safety, in the transaction at hand. */
export async function announceResume(scope: ShopScope, trialId: string): Promise<void> {
  await noteSetBack(scope, trialId, 'not due');
  const trial = await readRunningTrial(scope, trialId);
  const { machine } = trial;
  for (const id of new Set(trial.shifts.map(({ runs }) => runs))) {
    const person = await findAddressee(scope, id);
    if (person === null || !takesTexts(trial, person)) continue;
    const wish = { trialId, because: `${trialId}:${trial.revision}` };
    await tell(scope, person.personId, { template: 'resumed', params: { machine } }, wish);
  }
}
