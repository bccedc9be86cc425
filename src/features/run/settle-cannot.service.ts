import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import type { CannotDecision } from './cannot-decision.ts';
import { remindLater } from './cannot-reach.service.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import type { Run } from './run.ts';
import { moveToEnd } from './run-order.repository.ts';
import { takesTexts } from './run-people.service.ts';
import { findRunOf, requireRunStep, takeRunStep } from './run-reader.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { skipRun } from './skip-run.service.ts';
import { tell } from './tell.service.ts';

const answers = { use: 'cannotUse', later: 'cannotLater', 'rule out': 'cannotOut' } as const;

/**
 * Carries out what was decided for a run, in the transaction at hand, and tells whoever has it. A run that was closed
 * meanwhile is left alone.
 */
export async function settleCannot(
  scope: ShopScope,
  about: { runId: string; decision: CannotDecision; because: string },
): Promise<void> {
  const { runId, decision, because } = about;
  const run = await findRunOf(scope, runId);
  if (run.state === 'done' || run.state === 'skipped') return;
  await carryOut(scope, run, decision);
  const trial = await readRunningTrial(scope, run.trialId);
  const person = run.personId === null ? null : await findAddressee(scope, run.personId);
  if (person === null || !takesTexts(trial, person)) return;
  const params = { run: run.number, machine: trial.machine };
  await tell(
    scope,
    person.personId,
    { template: answers[decision], params },
    { trialId: trial.id, runId: run.id, because },
  );
}

async function carryOut(scope: ShopScope, run: Run, decision: CannotDecision): Promise<void> {
  if (decision === 'rule out') return skipRun(scope, { runId: run.id });
  if (decision === 'later' && run.state === 'asked') {
    await cancelUnsentPrompts(scope, { trialId: run.trialId, runId: run.id });
    const fresh = { personId: null, measurerId: null, askedAt: null, remindAt: null };
    await takeRunStep(scope, run, requireRunStep(run, 'take back'), fresh);
    return moveToEnd(scope, run);
  }
  const { remindMinutes } = await readRunningTrial(scope, run.trialId);
  await remindLater(scope, run, now() + remindMinutes * 60_000);
}
