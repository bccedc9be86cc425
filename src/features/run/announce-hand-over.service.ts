import type { ShopScope } from '../../server/db/scope.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { askForResults } from './ask-for-results.service.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import type { Run } from './run.ts';
import { findRunOf } from './run-reader.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { tell } from './tell.service.ts';

/**
 * What handing a run over sends out, in the transaction at hand: a prompt to the one before that has not gone out yet is
 * cancelled; one who had it in hand hears that it is somebody else's now. The next one is asked when its turn comes, or
 * at once for the numbers of a run that is made.
 * @param about.run the run as it was before
 * @param about.before who had it; null: nobody yet
 */
export async function announceHandOver(
  scope: ShopScope,
  about: { trial: Trial; run: Run; before: string | null; after: string },
): Promise<void> {
  const { run, before, after } = about;
  const trialId = about.trial.id;
  await cancelUnsentPrompts(scope, { trialId, runId: run.id });
  const present = await findRunOf(scope, run.id);
  const trial = await readRunningTrial(scope, trialId);
  if (run.state !== 'waiting' && before !== null && before !== after) {
    const name = (await findAddressee(scope, after))?.name ?? '';
    const params = { run: run.number, machine: trial.machine, name };
    const wish = { trialId, runId: run.id, because: `${run.id}:${present.revision}` };
    await tell(scope, before, { template: 'handedOver', params }, wish);
  }
  if (present.state === 'made') await askForResults(scope, trial, present);
}
