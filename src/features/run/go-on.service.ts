import type { ShopScope } from '../../server/db/scope.ts';
import type { Lead } from '../message/run-prompt.ts';
import { askNextRun } from './ask-next.service.ts';
import { listRuns } from './run.repository.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { talkOf, tell } from './tell.service.ts';

/**
 * What follows when a run was made, closed or skipped by text: the next run, or a word that it was kept. One text says
 * what came in and what comes next, where both go to the same phone. Call it in a transaction.
 */
export async function goOn(
  scope: ShopScope,
  about: { trialId: string; runId: string; lead: Lead; from: string; because: string },
): Promise<void> {
  const { trialId, runId, lead, from, because } = about;
  await talkOf(scope, from, 'idle');
  const trial = await readRunningTrial(scope, trialId);
  const next = await askNextRun(scope, trial, { lead, from });
  if (next?.personId === from) return;
  const runs = await listRuns(scope, trialId);
  const isWaiting = trial.state === 'running' && runs.some(({ state }) => state === 'waiting');
  const text =
    isWaiting && trial.pace.next === 'go'
      ? ({ template: 'go', params: { lead } } as const)
      : ({ template: 'noted', params: lead } as const);
  await tell(scope, from, text, { trialId, runId, because });
}
