import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { type FullAddressee, findAddressee } from '../message/addressee.repository.ts';
import { nextTextingMoment } from '../message/texting-hours.ts';
import { findShop } from '../shop/shop.repository.ts';
import type { RunningTrial } from './running-trial.ts';
import { shiftAt } from './shift.ts';

/** Whoever is called about a trial now: a person, or the words that were typed for one. */
export interface Caller {
  personId: string | null;
  name: string;
}

export async function readTimeZone(scope: ShopScope): Promise<string> {
  return (await findShop(scope)).timeZone;
}

/** The person on call of the shift that is on, else the trial's owner. */
export async function findCaller(scope: ShopScope, trial: RunningTrial): Promise<Caller> {
  const calls = shiftAt(trial, now(), await readTimeZone(scope))?.calls ?? '';
  const called = calls === '' ? null : await findAddressee(scope, calls);
  if (called?.active) return { personId: called.personId, name: called.name };
  const owner = await findAddressee(scope, trial.ownerId);
  return { personId: trial.ownerId, name: calls === '' ? (owner?.name ?? '') : calls };
}

/** Whether a person may be texted about this trial at all, whatever the hour. */
export function takesTexts(trial: RunningTrial, person: FullAddressee): boolean {
  const isReached =
    person.active && person.phone !== null && person.consent === 'agreed' && !person.isSuppressed;
  return isReached && trial.ways[person.personId] !== 'paper';
}

/** The person to text for something of this trial, if they may be texted right now. */
export async function findOnDuty(
  scope: ShopScope,
  trial: RunningTrial,
  personId: string,
): Promise<FullAddressee | null> {
  const person = await findAddressee(scope, personId);
  if (person === null || !takesTexts(trial, person)) return null;
  const at = now();
  const moment = nextTextingMoment(person.hours, at);
  return moment !== null && moment <= at ? person : null;
}

/** Everybody whom the answers name in this trial's crew, to make, to measure or to be called. */
export function crewOf(trial: RunningTrial): string[] {
  return [...new Set(trial.shifts.flatMap(({ runs, measures, calls }) => [runs, measures, calls]))].filter(
    (id) => id !== '',
  );
}
