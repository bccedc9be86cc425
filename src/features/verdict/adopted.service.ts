import { usualValues } from '../../lib/doe/index.ts';
import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { queueMessage } from '../message/message.service.ts';
import { readNames } from '../people/people.repository.ts';
import { readFinished } from '../trial/answer-problem.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { findLatestPlan } from '../trial/plan.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { listCrewMembers } from '../trial/trial-people.repository.ts';
import type { StoredVerdict } from './stored-verdict.ts';

/** New settings are asked after when the crew has worked with them for a week. */
const checkBackAfter = 7 * 24 * 3_600_000;

/**
 * Tells those concerned that the new settings are used from now on: whoever runs, measures or is called at the machine by
 * text and by mail, whoever planned the trial by mail; and asks that person a week later whether they hold.
 */
export async function announceAdoption(
  scope: ShopScope,
  about: { trial: Trial; verdict: StoredVerdict },
): Promise<void> {
  const { trial, verdict } = about;
  const plan = await findLatestPlan(scope, trial.id, 'main');
  if (!plan) throw new RangeError('announceAdoption: trial has no plan');
  const { answers } = await readStoredAnswers(scope, trial.id);
  const list = (values: readonly (number | string)[]) =>
    plan.brief.factors
      .map((factor, place) => `${factor.panelName ?? factor.name} ${values[place] ?? ''}`)
      .join(', ');
  const call = readFinished(answers, 'call');
  const caller =
    ('value' in call ? call.value.lines[0]?.whom : undefined) ??
    (await readNames(scope, [trial.ownerId])).get(trial.ownerId) ??
    '';
  const settings = list(verdict.facts.bet.actual);
  const common = { machine: trial.machine, settings };
  const page = `${config().appUrl}/trials/${trial.id}`;
  const shifts = answers.crew?.shifts ?? [];
  const named = shifts.flatMap(({ runs, measures, calls }) => [runs, measures, calls]);
  const crew = await listCrewMembers(
    scope,
    named.flatMap((id) => (id === undefined || id === '' ? [] : [id])),
  );
  // A trial may be opened again and its settings taken over once more: that is told again.
  const purpose = `${trial.id}:${trial.revision}`;
  for (const personId of new Set([trial.ownerId, ...crew.map(({ id }) => id)])) {
    await queueMessage(scope, {
      personId,
      trialId: trial.id,
      template: 'settingsInUse',
      params: { ...common, trial: trial.title, back: list(usualValues(plan.brief)), link: `${page}/card` },
      dedupe: `settings-mail:${purpose}:${personId}`,
    });
  }
  for (const { id: personId } of crew) {
    await queueMessage(scope, {
      personId,
      trialId: trial.id,
      template: 'settingsInUseText',
      params: { ...common, caller },
      dedupe: `settings-text:${purpose}:${personId}`,
    });
  }
  const later = { personId: trial.ownerId, trialId: trial.id, notBefore: now() + checkBackAfter };
  await queueMessage(scope, {
    ...later,
    template: 'checkBack',
    params: { ...common, trial: trial.title, link: `${page}/verdict#does-it-hold` },
    dedupe: `check-back-mail:${purpose}`,
  });
  await queueMessage(scope, {
    ...later,
    template: 'checkBackText',
    params: { machine: trial.machine, trial: trial.title },
    dedupe: `check-back-text:${purpose}`,
  });
}
