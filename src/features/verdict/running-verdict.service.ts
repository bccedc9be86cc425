import type { ShopScope } from '../../server/db/scope.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { judgeTrial } from './judge-trial.service.ts';
import { readTrialToJudge } from './make-verdict.service.ts';
import { runningKinds } from './running-words.ts';
import type { VerdictRun } from './verdict-runs.ts';
import type { RunningView, ViewedRun } from './verdict-view.ts';

const kinds: readonly string[] = runningKinds;

function toUnread(run: VerdictRun): ViewedRun {
  const { number, place, planned, coded, end } = run;
  return { number, order: place, planned, coded, readings: [], end: end ?? 'notRun' };
}

/**
 * What may be seen of a trial that has no verdict yet: its readings, slow change, odd readings. No change of any setting
 * leaves the server, so that nobody stops a trial on half of it.
 * @returns null before it was started
 * @throws AppError `not-found`
 */
export async function readRunningVerdict(scope: ShopScope, trialId: string): Promise<RunningView | null> {
  const trial = await findTrialOf(scope, trialId);
  const input = await readTrialToJudge(scope, trial.id);
  if (!input) return null;
  const facts = judgeTrial(input)?.facts;
  return {
    trialId: trial.id,
    number: trial.number,
    title: trial.title,
    machine: trial.machine,
    brief: input.brief,
    panelNames: input.brief.factors.map(({ panelName, name }) => panelName ?? name),
    units: input.brief.factors.map((factor) => (factor.kind === 'number' ? factor.unit : '')),
    runs: facts?.runs ?? input.runs.map(toUnread),
    plannedRuns: input.proposal.runs,
    facts: facts?.verdict.trust.filter(({ kind }) => kinds.includes(kind)) ?? [],
  };
}
