import type { ShopScope } from '../../server/db/scope.ts';
import { listReadings } from '../run/readings.repository.ts';
import { listRuns } from '../run/run.repository.ts';
import type { Reading, Run } from '../run/run.ts';
import { listStretches } from '../run/stretch.repository.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { listComments, type StoredComment } from '../trial/review.repository.ts';
import { reviewSubjects } from '../trial/review.schema.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { type TrialFile, trialFileSchema } from './pack/trial-file.schema.ts';
import { withoutPeople } from './pack/without-people.ts';
import {
  listStoredDecisions,
  listStoredPlans,
  listStoredReviews,
  listStoredVerdicts,
} from './trial-file.repository.ts';

function numberOf<Key, Value>(known: ReadonlyMap<Key, Value>, key: Key): Value {
  const found = known.get(key);
  if (found === undefined) throw new RangeError('readTrialFile: a row points at one that is not there');
  return found;
}

function toReadings(readings: readonly Reading[]) {
  const places = new Map(readings.map(({ id }, index) => [id, index]));
  return readings.map(
    ({ result, part, value, rejects, lot, state, source, reason, replacesId, createdAt }) => ({
      result,
      part,
      value,
      rejects,
      lot,
      state,
      source,
      reason,
      replaces: replacesId === null ? null : numberOf(places, replacesId),
      at: createdAt,
    }),
  );
}

async function listRunsInFile(scope: ShopScope, trialId: string, plans: ReadonlyMap<string, number>) {
  const runs = await listRuns(scope, trialId);
  const stretches = new Map((await listStretches(scope, trialId)).map(({ id, n }) => [id, n]));
  const numbers = new Map(runs.map(({ id, number }) => [id, number]));
  const readings = await listReadings(
    scope,
    runs.map(({ id }) => id),
  );
  return runs.map((run: Run) => ({
    plan: numberOf(plans, run.planId),
    number: run.number,
    place: run.place,
    block: run.block,
    wholePlot: run.wholePlot,
    group: run.group,
    center: run.center,
    warmUp: run.warmUp,
    coded: run.coded,
    planned: run.planned,
    actual: run.actual,
    state: run.state,
    end: run.end,
    gauge: run.gauge,
    label: run.label,
    stretch: run.stretchId === null ? null : numberOf(stretches, run.stretchId),
    repeats: run.repeatsRunId === null ? null : numberOf(numbers, run.repeatsRunId),
    askedAt: run.askedAt,
    madeAt: run.madeAt,
    measuredAt: run.measuredAt,
    closedAt: run.closedAt,
    readings: toReadings(readings.filter(({ runId }) => runId === run.id)),
  }));
}

async function listReviewsInFile(scope: ShopScope, trialId: string) {
  const comments: StoredComment[] = [];
  for (const subject of reviewSubjects) comments.push(...(await listComments(scope, trialId, subject)));
  return (await listStoredReviews(scope, trialId)).map((review) => ({
    subject: review.subject,
    subjectHash: review.subject_hash,
    round: review.round,
    state: review.state,
    askedAt: review.asked_at,
    decidedAt: review.decided_at,
    comments: comments
      .filter(({ review_id }) => review_id === review.id)
      .map(({ place, words, created_at, settled_at }) => ({
        place,
        words,
        at: created_at,
        settledAt: settled_at,
      })),
  }));
}

/**
 * The whole trial as its file says it, without the name of any person. Notes, problems and photos stay in the shop: they
 * are people's own words and pictures, which they may have erased.
 * @throws AppError `not-found`, for another shop's trial too
 */
export async function readTrialFile(scope: ShopScope, trialId: string): Promise<TrialFile> {
  const trial = await findTrialOf(scope, trialId);
  const { answers, frozenHash } = await readStoredAnswers(scope, trialId);
  const plans = await listStoredPlans(scope, trialId);
  const verdicts = await listStoredVerdicts(scope, trialId);
  const verdictNumbers = new Map(verdicts.map(({ id, n }) => [id, n]));
  const stretches = await listStretches(scope, trialId);
  return trialFileSchema.parse({
    format: 'trywell-trial',
    version: 1,
    trial: {
      number: trial.number,
      title: trial.title,
      machine: trial.machine,
      phase: trial.phase,
      state: trial.state,
      createdAt: trial.createdAt,
      updatedAt: trial.updatedAt,
    },
    answers: { frozenHash, document: { v: 1, questions: withoutPeople(answers) } },
    plans: plans.map(({ id: _, ...plan }) => plan),
    stretches: stretches.map(({ id: _, ...stretch }) => stretch),
    runs: await listRunsInFile(scope, trialId, new Map(plans.map(({ id, n }) => [id, n]))),
    verdicts: verdicts.map(({ id: _, ...verdict }) => verdict),
    decisions: (await listStoredDecisions(scope, trialId)).map(({ verdictId, ...decision }) => ({
      ...decision,
      verdict: numberOf(verdictNumbers, verdictId),
    })),
    reviews: await listReviewsInFile(scope, trialId),
  });
}

/** The file's text: the same trial always has the same bytes. */
export function writeTrialFile(file: TrialFile): string {
  return `${JSON.stringify(file, null, 1)}\n`;
}
