import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { queueMessage } from '../message/message.service.ts';
import { isAtWork } from '../people/at-work.ts';
import { findPerson } from '../people/person.repository.ts';
import { findShop } from '../shop/shop.repository.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { crewOf } from '../trial/readiness.ts';
import type { Trial } from '../trial/trial.ts';
import type { Run } from './run.ts';
import { findCaller } from './run-people.service.ts';
import { requirePlan } from './run-reader.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { noteSetBack } from './set-back.repository.ts';
import { listUsualSettings } from './usual-settings.ts';

/** Those who must hear of a stop: whoever has a run in hand, is called, or is of the crew and at work now. */
async function listConcerned(scope: ShopScope, trial: Trial, runs: readonly Run[]): Promise<string[]> {
  const { timeZone } = await findShop(scope);
  const inHand = runs
    .filter(({ state }) => state === 'asked' || state === 'made')
    .flatMap(({ personId, measurerId }) => [personId, measurerId]);
  const { answers } = await readStoredAnswers(scope, trial.id);
  const concerned = new Set(inHand.filter((id) => id !== null));
  for (const { id } of crewOf(answers)) {
    const person = await findPerson(scope, id);
    if (person && isAtWork(person.workSpans, now(), timeZone)) concerned.add(id);
  }
  const running = await readRunningTrial(scope, trial.id);
  const caller = await findCaller(scope, running);
  // Whoever stopped it on the board knows.
  const by = scope.actor.kind === 'person' ? scope.actor.id : null;
  for (const id of [caller.personId, trial.ownerId]) if (id !== null && id !== by) concerned.add(id);
  return [...concerned];
}

/**
 * Tells those on shift, before all other texts, that a trial is stopped and what to set back to, in the transaction at
 * hand. Whoever has no phone, or never agreed to texts, must be told by voice: the board says who.
 * @param about.stop names this stop, so that each is told once of each
 * @returns those who have no phone to text
 */
export async function announceHold(
  scope: ShopScope,
  about: { trial: Trial; runs: readonly Run[]; stop: number },
): Promise<string[]> {
  const { trial, runs, stop } = about;
  await noteSetBack(scope, trial.id, 'asked');
  const { brief } = await requirePlan(scope, trial.id);
  const { answers } = await readStoredAnswers(scope, trial.id);
  const caller = answers.call?.lines[0]?.whom?.trim() ?? '';
  const unreached: string[] = [];
  for (const personId of await listConcerned(scope, trial, runs)) {
    const sent = await queueMessage(scope, {
      personId,
      template: 'stopped',
      params: { machine: trial.machine, settings: listUsualSettings(brief), caller },
      dedupe: `stopped:${trial.id}:${stop}:${personId}`,
      urgent: true,
      trialId: trial.id,
    });
    if (!sent.queued && sent.reason === 'no-address') unreached.push(personId);
  }
  return unreached;
}
