import type { FactorSpec } from '../../lib/doe/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import { listReadings } from '../run/readings.repository.ts';
import { listResultItems } from '../run/result-items.ts';
import { listRuns } from '../run/run.repository.ts';
import type { Run } from '../run/run.ts';
import { requirePlan } from '../run/run-reader.service.ts';
import { safetyOf } from '../run/safety-of.ts';
import { findShop } from '../shop/shop.repository.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { settingMarkOf } from '../trial/setting-mark.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { openPhone, type PhoneVisit } from './phone-link.service.ts';
import type { PhoneRun, PhoneView } from './phone-view.ts';

/** What this person has in hand: a run to make first, else one that waits for their reading. */
export function findOwnRun(runs: readonly Run[], personId: string): Run | null {
  const making = runs.find((run) => run.personId === personId && run.state === 'asked');
  const doubted = runs.find((run) => run.personId === personId && run.state === 'doubtful');
  const measuring = runs.find((run) => run.state === 'made' && (run.measurerId ?? run.personId) === personId);
  return making ?? doubted ?? measuring ?? null;
}

/** Settings that differ from the run before need time to settle; the first run of all sets every dial. */
function settling(run: Run, before: Run | undefined, factors: readonly FactorSpec[]) {
  const changed = factors.filter((_, place) => before?.planned[place] !== run.planned[place]);
  return {
    waitMinutes: Math.max(0, ...changed.map(({ settleMinutes = 0 }) => settleMinutes)),
    throwAway: Math.max(0, ...changed.map(({ discardParts = 0 }) => discardParts)),
  };
}

function toPhoneRun(run: Run, runs: readonly Run[], factors: readonly FactorSpec[]): PhoneRun {
  const before = runs
    .filter(({ place, state }) => place < run.place && state !== 'skipped')
    .sort((a, b) => b.place - a.place)[0];
  return {
    id: run.id,
    number: run.number,
    state: run.state === 'made' || run.state === 'doubtful' ? run.state : 'asked',
    revision: run.revision,
    settings: factors.map((factor, place) => ({
      name: factor.panelName ?? factor.name,
      value: run.planned[place] ?? '',
      unit: factor.kind === 'number' ? factor.unit : '',
      mark: settingMarkOf(factor, run.coded[place] ?? 0),
    })),
    ...settling(run, before, factors),
  };
}

async function findLast(
  scope: ShopScope,
  runs: readonly Run[],
  personId: string,
): Promise<PhoneView['last']> {
  const [done] = runs
    .filter((run) => run.state === 'done' && (run.measurerId ?? run.personId) === personId)
    .sort((a, b) => (b.closedAt ?? 0) - (a.closedAt ?? 0));
  if (!done) return null;
  const readings = await listReadings(scope, [done.id]);
  const figures = readings
    .filter(({ state }) => state === 'counts')
    .map(({ value, rejects }) => value ?? rejects);
  return { number: done.number, figures: figures.join('  ') };
}

/**
 * What a person's phone page shows: their own run and nothing of anybody else's.
 * @throws AppError `gone` for a link that has ended, `too-many` visits from this network
 */
export async function readPhonePage(visit: PhoneVisit): Promise<PhoneView> {
  const { scope, personId, trialId } = await openPhone(visit);
  const person = await findAddressee(scope, personId);
  if (!person) throw new AppError('gone');
  const trial = await findTrialOf(scope, trialId);
  const { brief } = await requirePlan(scope, trialId);
  const runs = await listRuns(scope, trialId);
  const { answers } = await readStoredAnswers(scope, trialId);
  const own = findOwnRun(runs, personId);
  const isRun = trial.state === 'running' || trial.state === 'paused' || trial.state === 'held';
  return {
    language: person.language,
    personName: person.name,
    trialId,
    machine: trial.machine,
    shopNumber: (await findShop(scope)).textNumber,
    runs: runs.length,
    state: isRun ? (trial.state as 'running' | 'paused' | 'held') : 'over',
    run: own && isRun ? toPhoneRun(own, runs, brief.factors) : null,
    items: listResultItems(brief),
    ...safetyOf(answers, person.language),
    last: await findLast(scope, runs, personId),
  };
}
