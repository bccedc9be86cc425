import { type Role, rolesMay } from '../../server/auth/permissions.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { readNames } from '../people/people.repository.ts';
import { findTrial, type TrialCondition, updateTrial } from './trial.repository.ts';
import type { PublicTrial } from './trial.schema.ts';
import type { Trial } from './trial.ts';
import { listReviewers } from './trial-people.repository.ts';
import {
  type Transition,
  type TrialActor,
  type TrialEvent,
  transitions,
  transitionsOf,
} from './trial-states.ts';

/** Whoever asks something of a trial. */
export interface TrialReader {
  personId: string;
  roles: readonly Role[];
}

/** @throws AppError `not-found`, for another shop's trial too */
export async function findTrialOf(scope: ShopScope, id: string): Promise<Trial> {
  const trial = await findTrial(scope, id);
  if (!trial) throw new AppError('not-found', { detail: 'no such trial' });
  return trial;
}

export async function toPublicTrials(scope: ShopScope, trials: readonly Trial[]): Promise<PublicTrial[]> {
  const names = await readNames(
    scope,
    trials.map(({ ownerId }) => ownerId),
  );
  return trials.map(({ ownerId, ...trial }) => ({ ...trial, ownerName: names.get(ownerId) ?? '' }));
}

export async function readPublicTrial(scope: ShopScope, id: string): Promise<PublicTrial> {
  const [shown] = await toPublicTrials(scope, [await findTrialOf(scope, id)]);
  if (!shown) throw new RangeError('readPublicTrial: id has no trial');
  return shown;
}

export function isReaderAllowed(
  reader: TrialReader,
  by: readonly TrialActor[],
  isReviewer: boolean,
): boolean {
  return by.some((actor) => {
    if (actor === 'product') return false;
    return actor === 'safety person' ? isReviewer : rolesMay(reader.roles, actor);
  });
}

/**
 * The steps that an event may mean for a trial in its state, if this reader may take them: at least one, several where a
 * condition tells them apart.
 * @throws AppError `forbidden` for who may never do it; `not-now` where the state has no such step
 */
export async function findSteps(
  scope: ShopScope,
  trial: Trial,
  event: TrialEvent,
  reader: TrialReader,
): Promise<[Transition, ...Transition[]]> {
  const isReviewer = (await listReviewers(scope)).includes(reader.personId);
  const may = ({ by }: Transition) => isReaderAllowed(reader, by, isReviewer);
  if (!transitions.some((step) => step.event === event && may(step))) {
    throw new AppError('forbidden', { detail: `may not ${event}` });
  }
  const [step, ...others] = transitionsOf(trial.state, event).filter(may);
  if (!step) throw new AppError('not-now', { detail: `${event} in ${trial.state}` });
  return [step, ...others];
}

/** The step of an event that means one thing only. @throws AppError as `findSteps` */
export async function findStep(
  scope: ShopScope,
  trial: Trial,
  event: TrialEvent,
  reader: TrialReader,
): Promise<Transition> {
  const [step] = await findSteps(scope, trial, event, reader);
  return step;
}

/** Takes a trial one step on, if it is still as it was seen. @throws AppError `changed-meanwhile` with the present state */
export async function takeStep(
  scope: ShopScope,
  trial: Trial,
  step: Transition,
  revision: number = trial.revision,
): Promise<void> {
  if (step.to === 'gone') throw new RangeError('takeStep: step.to is no state');
  const which: TrialCondition = { id: trial.id, from: [step.from], revision };
  if (!(await updateTrial(scope, which, { state: step.to }))) throw await changedMeanwhile(scope, trial.id);
}

export async function changedMeanwhile(scope: ShopScope, trialId: string): Promise<AppError> {
  return new AppError('changed-meanwhile', { present: await readPublicTrial(scope, trialId) });
}
