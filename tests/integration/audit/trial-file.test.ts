import { beforeAll, describe, expect, it } from 'vitest';
import { type TrialFile, trialFileSchema } from '../../../src/features/audit/pack/trial-file.schema.ts';
import { readTrialFile, writeTrialFile } from '../../../src/features/audit/trial-file.service.ts';

import { importTrial } from '../../../src/features/trial/import-trial.service.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import { findTrialOf } from '../../../src/features/trial/trial-reader.service.ts';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { AppError } from '../../../src/server/errors.ts';
import { fieldProblems } from '../../../src/server/http/field-problems.ts';
import { bodyLimitFor } from '../../../src/server/limits.ts';
import { measureRuns } from '../../builders/measured-trial.ts';
import { buildJudgedTrial, buildStand, hotter, type Stand } from './audit-fixture.ts';

let home: Stand;
let written: string;

const act = async ({ scope, reader }: Stand, trialId: string, event: Record<string, unknown>) => {
  const { revision } = await findTrialOf(scope, trialId);
  const body = { revision, note: '', ...event } as Parameters<typeof carryOutEvent>[1]['body'];
  await carryOutEvent(scope, { trialId, body }, reader);
};

/** A trial with all that a file can hold: check runs, two verdicts, an adoption. */
beforeAll(async () => {
  home = await buildStand();
  const id = await buildJudgedTrial(home);
  await act(home, id, { event: 'plan check runs' });
  await measureRuns(home.scope, id, hotter);
  await home.scope.db('trials').where({ id }).update({ state: 'readings in' });
  await makeVerdict(home.scope, id);
  await act(home, id, { event: 'adopt', unchecked: true, note: 'no time for more' });
  written = writeTrialFile(await readTrialFile(home.scope, id));
});

const readWritten = (): TrialFile => trialFileSchema.parse(JSON.parse(written));
const storedVerdicts = ({ scope }: Stand, trialId: string) =>
  scope.db('verdicts').where({ shop_id: scope.shopId, trial_id: trialId }).orderBy('n');

async function refusals(work: Promise<unknown>): Promise<string[]> {
  const error = await work.then(
    () => null,
    (thrown: unknown) => thrown,
  );
  return error instanceof AppError ? error.fields.map(({ pointer, code }) => `${pointer} ${code}`) : [];
}

/** The file with something else at one place. */
function changed(place: string, value: unknown): unknown {
  const file: unknown = JSON.parse(written);
  const keys = place.split('/');
  const last = keys.pop() ?? '';
  // A walk through plain JSON, whose shape only the test's own place knows.
  const at = keys.reduce<Record<string, unknown>>(
    (inner, key) => inner[key] as Record<string, unknown>,
    file as Record<string, unknown>,
  );
  at[last] = value;
  return file;
}

describe('trial.json', () => {
  it('brought into an empty shop gives the same verdicts, byte for byte, and says the same again', async () => {
    const away = await buildStand();
    const { id, state } = await importTrial(away.scope, readWritten(), away.reader);
    expect(state).toBe('closed');
    const [theirs, ours] = [await storedVerdicts(away, id), await storedVerdicts(home, await homeId())];
    expect(ours).toHaveLength(2);
    const evidence = ['n', 'input_hash', 'core_version', 'facts', 'analysis', 'created_at'];
    for (const column of evidence) {
      expect(theirs.map((row) => row[column])).toEqual(ours.map((row) => row[column]));
    }
    const again = JSON.parse(writeTrialFile(await readTrialFile(away.scope, id)));
    const first = JSON.parse(written);
    for (const part of ['plans', 'stretches', 'runs', 'verdicts', 'decisions']) {
      expect(again[part]).toEqual(first[part]);
    }
    expect(again.answers.document).toEqual(first.answers.document);
  });

  it('without its verdicts is judged anew in the other shop, to the same bytes', async () => {
    const away = await buildStand();
    const file = { ...readWritten(), verdicts: [], decisions: [] };
    file.trial.state = 'deciding';
    const { id, state } = await importTrial(away.scope, file, away.reader);
    expect(state).toBe('readings in');
    expect(await makeVerdict(away.scope, id)).toBe(true);
    const [anew] = await storedVerdicts(away, id);
    const latest = (await storedVerdicts(home, await homeId())).at(-1);
    for (const column of ['input_hash', 'core_version', 'facts', 'analysis']) {
      expect(anew[column]).toBe(latest[column]);
    }
  });

  it('names no person, and no one who brings it in has agreed to anything', async () => {
    expect(written).not.toContain('Odila');
    expect(written).not.toContain('Dana');
    expect(written).not.toContain(home.reader.personId);
    const away = await buildStand();
    const { id } = await importTrial(away.scope, readWritten(), away.reader);
    expect(await away.scope.db('reviews').where({ trial_id: id })).toEqual([]);
    const [line] = await away.scope.db('activity').where({ subject_id: id });
    expect(line).toMatchObject({ kind: 'trial.imported', actor_id: away.reader.personId });
  });

  it('of a running trial comes in paused: nobody is texted by a file', async () => {
    const away = await buildStand();
    const file = readWritten();
    file.trial.state = 'running';
    const { id, state } = await importTrial(away.scope, file, away.reader);
    expect(state).toBe('paused');
    const runs = await away.scope.db('runs').where({ trial_id: id });
    expect(runs.every(({ person_id }) => person_id === null)).toBe(true);
  });

  it('of a draft is a draft again, to be planned and ticked in this shop', async () => {
    const away = await buildStand();
    const file = { ...readWritten(), stretches: [], runs: [], verdicts: [], decisions: [] };
    file.trial.state = 'ready';
    const { id, state } = await importTrial(away.scope, file, away.reader);
    expect(state).toBe('draft');
    expect(await away.scope.db('plans').where({ trial_id: id })).toEqual([]);
    const row = await away.scope.db('answers').where({ trial_id: id }).first();
    expect(row.frozen_hash).toBeNull();
    expect(row.document).toContain('seal strength');
    expect(row.document).not.toContain('guardsOn');
  });

  it.each([
    ['format', 'something else', '#/format not-a-trial-file'],
    ['version', 2, '#/version unknown-version'],
    ['runs/2/coded', 'low', '#/runs/2/coded wrong-kind'],
    ['runs/2/readings/0/value', 'much', '#/runs/2/readings/0/value wrong-kind'],
    ['plans/0/brief/factors/0/low', null, '#/plans/0/brief/factors/0/low wrong-kind'],
    ['trial/nickname', 'x', '#/trial/nickname unknown-field'],
    ['verdicts/0/facts/verdict/headline', {}, '#/verdicts/0/facts/verdict/headline/kind not-a-choice'],
  ])('with %s as %j is refused at its place', (place, value, refusal) => {
    const parsed = trialFileSchema.safeParse(changed(place, value), { reportInput: true });
    expect(parsed.success).toBe(false);
    if (!parsed.success)
      expect(fieldProblems(parsed.error).map((each) => `${each.pointer} ${each.code}`)).toContain(refusal);
  });

  it.each([
    ['runs/1/number', 1, '#/runs/1/number twice'],
    ['runs/1/plan', 77, '#/runs/1/plan points-nowhere'],
    ['runs/1/coded', [1], '#/runs/1/coded one-each'],
    ['runs/1/repeats', 900, '#/runs/1/repeats points-nowhere'],
    ['runs/1/stretch', 9, '#/runs/1/stretch points-nowhere'],
    ['runs/1/readings/0/replaces', 5, '#/runs/1/readings/0/replaces points-nowhere'],
    ['runs/1/readings/0/result', 3, '#/runs/1/readings/0/result points-nowhere'],
    ['decisions/0/verdict', 40, '#/decisions/0/verdict points-nowhere'],
    ['plans/0/settingIds', [], '#/plans/0/settingIds one-each'],
    ['plans', [], '#/plans missing'],
    ['runs', [], '#/runs missing'],
    ['verdicts/1/facts/bet/predicted', 99, '#/verdicts/1/facts does-not-follow'],
    ['verdicts/1/analysis/results/0/analysis/n', 99, '#/verdicts/1/analysis does-not-follow'],
    ['runs/1/readings/0/value', 12, '#/verdicts/1/inputHash does-not-follow'],
    ['plans/0/proposal/layout/0/x', [], '#/plans/0/proposal/layout/0/x one-each'],
    ['plans/0/brief/factors/0/low', 1e6, '#/plans/0/brief/factors/0/low low-not-below-high'],
    ['plans/0/proposal/terms', ['Z'], '#/runs does-not-fit'],
    ['trial/state', 'draft', '#/runs does-not-fit'],
  ])('with %s as %j is brought in not at all', async (place, value, refusal) => {
    const away = await buildStand();
    const file = trialFileSchema.parse(changed(place, value));
    expect(await refusals(importTrial(away.scope, file, away.reader))).toContain(refusal);
    for (const table of ['trials', 'answers', 'plans', 'runs', 'verdicts', 'activity']) {
      expect(await away.scope.db(table).where({ shop_id: away.scope.shopId })).toEqual([]);
    }
  });

  it('may be 5 MB and no more', () => {
    expect(bodyLimitFor('/api/trials/import')).toBe(5 * 1024 * 1024);
    expect(written.length).toBeLessThan(1024 * 1024);
  });
});

async function homeId(): Promise<string> {
  const trial = await home.scope.db('trials').where({ shop_id: home.scope.shopId }).first('id');
  return String(trial.id);
}
