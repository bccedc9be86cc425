import type { ShopScope } from '../../server/db/scope.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import type { Run } from './run.ts';
import { findCaller } from './run-people.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { tell } from './tell.service.ts';

/** Tells whoever is called about a trial what is wrong at its machine, in the transaction at hand. */
export async function announceProblem(
  scope: ShopScope,
  problem: { id: string; trialId: string; run: Run | null; words: string; raisedBy: string | null },
): Promise<void> {
  const { id, trialId, run, words, raisedBy } = problem;
  const trial = await readRunningTrial(scope, trialId);
  const { personId } = await findCaller(scope, trial);
  if (personId === null || personId === raisedBy) return;
  const raiser = raisedBy === null ? null : await findAddressee(scope, raisedBy);
  const params = {
    machine: trial.machine,
    run: run?.number ?? null,
    name: raiser?.name ?? '',
    words: words === '' ? '?' : words,
  };
  await tell(scope, personId, { template: 'problemRaised', params }, { trialId, because: id });
}
