import { rolesMay } from '../../server/auth/permissions.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { readNames } from '../people/people.repository.ts';
import { listNotes } from '../run/note.repository.ts';
import { listReadings } from '../run/readings.repository.ts';
import { listResultItems } from '../run/result-items.ts';
import { listRuns } from '../run/run.repository.ts';
import type { Run } from '../run/run.ts';
import { listStretches } from '../run/stretch.repository.ts';
import { listRepliesToRun, listTextsOfRun } from '../run/talk.repository.ts';
import { findLatestPlan } from '../trial/plan.repository.ts';
import type { TrialReader } from '../trial/trial-reader.service.ts';
import type { AuditDataView, AuditText } from './audit-data-view.ts';
import { listFactors } from './audit-factors.ts';

/** Who ran what is for those who lead the crew; figures are never shown by person. */
export function maySeeNames(reader: TrialReader): boolean {
  return rolesMay(reader.roles, 'operator.invite') || rolesMay(reader.roles, 'people.manage');
}

type Talk = Omit<AuditText, 'who'> & { personId: string | null };

async function readTalk(
  scope: ShopScope,
  run: Run,
  notes: Awaited<ReturnType<typeof listNotes>>,
): Promise<Talk[]> {
  const texts = await listTextsOfRun(scope, run.id);
  const replies = await listRepliesToRun(scope, run.id);
  const talk: Talk[] = [
    ...texts.map(({ person_id, body, state, created_at, sent_at }) => ({
      kind: 'text' as const,
      at: sent_at ?? created_at,
      personId: person_id,
      words: body,
      state,
    })),
    ...replies.map(({ person_id, body, sent_at }) => ({
      kind: 'reply' as const,
      at: sent_at,
      personId: person_id,
      words: body,
      state: null,
    })),
    ...notes
      .filter((note) => note.run_id === run.id)
      .map(({ written_by, words, created_at }) => ({
        kind: 'note' as const,
        at: created_at,
        personId: written_by,
        words,
        state: null,
      })),
  ];
  return talk.sort((one, other) => one.at - other.at);
}

/** Every run with all that was said, set and read, whatever became of it; null before a plan was chosen. */
export async function readAuditData(
  scope: ShopScope,
  trialId: string,
  reader: TrialReader,
): Promise<AuditDataView | null> {
  const plan = await findLatestPlan(scope, trialId, 'main');
  if (!plan) return null;
  const runs = await listRuns(scope, trialId);
  const readings = await listReadings(
    scope,
    runs.map(({ id }) => id),
  );
  const stretches = await listStretches(scope, trialId);
  const notes = await listNotes(scope, trialId);
  const talks = new Map<string, Talk[]>();
  for (const run of runs) talks.set(run.id, await readTalk(scope, run, notes));
  const showsNames = maySeeNames(reader);
  const people = [
    ...runs.flatMap(({ personId, measurerId }) => [personId, measurerId]),
    ...readings.map(({ enteredBy }) => enteredBy),
    ...[...talks.values()].flat().map(({ personId }) => personId),
  ];
  const names = showsNames
    ? await readNames(scope, [...new Set(people.filter((id) => id !== null))])
    : new Map<string, string>();
  const nameOf = (id: string | null) => (id === null ? null : (names.get(id) ?? null));
  const items = listResultItems(plan.brief);
  const numberOf = new Map(runs.map(({ id, number }) => [id, number]));
  return {
    factors: listFactors(plan.brief),
    showsNames,
    stretches,
    runs: runs.map((run) => ({
      ...run,
      phase: run.planId === plan.id ? 'main' : 'check',
      stretch: stretches.find(({ id }) => id === run.stretchId)?.n ?? null,
      maker: nameOf(run.personId),
      measurer: nameOf(run.measurerId),
      texts: (talks.get(run.id) ?? []).map(({ personId, ...talk }) => ({ ...talk, who: nameOf(personId) })),
    })),
    readings: readings.map((reading) => ({
      ...reading,
      runNumber: numberOf.get(reading.runId) ?? 0,
      resultName: items[reading.result]?.name ?? '',
      unit: items[reading.result]?.unit ?? '',
      enteredByName: nameOf(reading.enteredBy),
    })),
  };
}
