import { rolesMay } from '../../server/auth/permissions.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { readMonthlyTexts } from '../message/monthly-texts.service.ts';
import { countTextsSent } from '../message/text-count.repository.ts';
import { readNames } from '../people/people.repository.ts';
import type { StoredPlan } from '../trial/plan.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { listReviewers } from '../trial/trial-people.repository.ts';
import { findTrialOf, isReaderAllowed, type TrialReader } from '../trial/trial-reader.service.ts';
import { type TrialActor, transitions } from '../trial/trial-states.ts';
import type { Board, BoardRun, BoardSetting } from './board.schema.ts';
import { listPhotos, type StoredPhoto } from './photo.repository.ts';
import { listOpenProblems } from './problem.repository.ts';
import { blockingKinds } from './problem-kinds.ts';
import { readStop } from './read-stop.service.ts';
import { listReadings } from './readings.repository.ts';
import { listResultItems } from './result-items.ts';
import { whoResumes } from './resume-trial.service.ts';
import { listRuns, readBoardRevision } from './run.repository.ts';
import type { Reading, Run } from './run.ts';
import { eventsOfReader } from './run-event.service.ts';
import { listOperators } from './run-people.repository.ts';
import { requirePlan } from './run-reader.service.ts';
import { readSetBack } from './set-back.repository.ts';
import { listStretches } from './stretch.repository.ts';
import { stampOfTexts } from './talk.repository.ts';
import { listUnanswered, type Unanswered } from './unanswered.repository.ts';

/**
 * Names what a board shows, so that whoever has it already is told so.
 * @throws AppError `not-found`; `not-now` for a trial that was never started
 */
export async function readBoardStamp(scope: ShopScope, trialId: string): Promise<string> {
  const trial = await findTrialOf(scope, trialId);
  if (['draft', 'plan review', 'ready'].includes(trial.state)) {
    throw new AppError('not-now', { detail: 'a board before the start' });
  }
  return `${await readBoardRevision(scope, trialId)}-${await stampOfTexts(scope, trialId)}`;
}

function toSettings({ brief }: StoredPlan): BoardSetting[] {
  return brief.factors.map((factor) => ({
    name: factor.panelName ?? factor.name,
    kind: factor.kind,
    unit: factor.kind === 'number' ? factor.unit : '',
    low: factor.low,
    high: factor.high,
    usual: factor.kind === 'number' ? factor.usual : factor[factor.usual],
  }));
}

function toFigures(readings: readonly Reading[]): BoardRun['figures'] {
  return readings
    .filter(({ state }) => state === 'counts' || state === 'asked back')
    .map(({ result, part, value, rejects, lot, state }) => ({
      result,
      part,
      value,
      rejects,
      lot,
      isAskedBack: state === 'asked back',
    }))
    .sort((one, other) => one.result - other.result || one.part - other.part);
}

function toBoardRun(
  run: Run,
  about: {
    runs: readonly Run[];
    readings: readonly Reading[];
    photos: readonly StoredPhoto[];
    unanswered: ReadonlyMap<string, Unanswered>;
    names: ReadonlyMap<string, string>;
    reader: TrialReader;
  },
): BoardRun {
  const { runs, readings, photos, unanswered, names, reader } = about;
  const toPerson = (id: string | null) => (id === null ? null : { id, name: names.get(id) ?? '' });
  const { id, number, block, center, warmUp, coded, planned, actual, state, end, revision, label } = run;
  const { askedAt, madeAt, measuredAt, closedAt } = run;
  return {
    ...{ id, number, block, center, warmUp, coded, planned, actual, state, end, revision, label },
    ...{ askedAt, madeAt, measuredAt, closedAt },
    person: toPerson(run.personId),
    measurer: toPerson(run.measurerId),
    repeats: runs.find((other) => other.id === run.repeatsRunId)?.number ?? null,
    figures: toFigures(readings.filter(({ runId }) => runId === id)),
    unanswered: unanswered.get(id) ?? null,
    photos: photos
      .filter(({ run_id }) => run_id === id)
      .map(({ id: photo, width, height, created_at, sent_by }) => ({
        ...{ id: photo, width, height, at: created_at },
        by: sent_by === null ? '' : (names.get(sent_by) ?? ''),
      })),
    events: eventsOfReader(run, reader),
  };
}

async function readEvents(scope: ShopScope, trial: Trial, reader: TrialReader): Promise<Board['events']> {
  const isReviewer = (await listReviewers(scope)).includes(reader.personId);
  const may = (by: readonly TrialActor[]) => isReaderAllowed(reader, by, isReviewer);
  const open = transitions.filter(({ from, by }) => from === trial.state && may(by));
  const byReviewer = (await whoResumes(scope, trial)) === 'reviewer';
  const events = new Set(open.map(({ event }) => event));
  if (byReviewer && !isReviewer) events.delete('resume');
  return [...events];
}

async function readTexts(scope: ShopScope, trialId: string): Promise<Board['texts']> {
  const { texts, parts } = await countTextsSent(scope, { trialId });
  return { sent: texts, parts, month: await readMonthlyTexts(scope) };
}

/**
 * Everything that the board of a trial shows, for whoever reads it.
 * @throws AppError `not-found`; `not-now` for a trial that was never started
 */
export async function readBoard(scope: ShopScope, trialId: string, reader: TrialReader): Promise<Board> {
  // The stamp first: what changes while the rest is read is then seen as a change the next time.
  const stamp = await readBoardStamp(scope, trialId);
  const trial = await findTrialOf(scope, trialId);
  const plan = await requirePlan(scope, trialId);
  const runs = await listRuns(scope, trialId);
  const readings = await listReadings(
    scope,
    runs.map(({ id }) => id),
  );
  const photos = await listPhotos(
    scope,
    runs.map(({ id }) => id),
  );
  const unanswered = await listUnanswered(scope, runs);
  const problems = await listOpenProblems(scope, trialId);
  const people = runs.flatMap(({ personId, measurerId }) => [personId, measurerId]);
  const senders = [...problems.map(({ raised_by }) => raised_by), ...photos.map(({ sent_by }) => sent_by)];
  const ids = [...people, ...senders].filter((id) => id !== null);
  const names = await readNames(scope, [...new Set(ids)]);
  const { number, title, machine, phase, state, revision } = trial;
  return {
    ...{ trialId, number, title, machine, phase, state, revision, stamp },
    settings: toSettings(plan),
    results: listResultItems(plan.brief),
    runs: runs.map((run) => toBoardRun(run, { runs, readings, photos, unanswered, names, reader })),
    problems: problems.map(({ id, kind, run_id, words, raised_by, raised_at }) => ({
      id,
      kind,
      blocks: blockingKinds.includes(kind),
      runId: run_id,
      runNumber: runs.find((run) => run.id === run_id)?.number ?? null,
      words,
      by: raised_by === null ? '' : (names.get(raised_by) ?? ''),
      at: raised_at,
    })),
    stretches: (await listStretches(scope, trialId)).map(({ n, kind, words, at }) => ({
      n,
      kind,
      words,
      at,
    })),
    setBack: await readSetBack(scope, trialId),
    stop: state === 'held' ? await readStop(scope, trialId, reader) : null,
    texts: await readTexts(scope, trialId),
    crew: await listOperators(scope),
    minutesPerRun: plan.brief.budget.minutesPerRun ?? null,
    events: await readEvents(scope, trial, reader),
    mayRun: rolesMay(reader.roles, 'trial.run'),
    mayRaise: rolesMay(reader.roles, 'problem.raise'),
    resumeByReviewer: (await whoResumes(scope, trial)) === 'reviewer',
  };
}
