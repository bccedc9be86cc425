import { beforeAll, describe, expect, it } from 'vitest';
import { changePerson } from '../../../src/features/people/change-person.service.ts';
import { erasePerson } from '../../../src/features/people/erase.service.ts';
import { importPeople, previewImport } from '../../../src/features/people/import.service.ts';
import { addPerson } from '../../../src/features/people/person.service.ts';
import { recordRun } from '../../../src/features/run/record-run.service.ts';
import { findRun } from '../../../src/features/run/run.repository.ts';
import { setApart } from '../../../src/features/run/text-figures.service.ts';
import { readStoredAnswers } from '../../../src/features/trial/answers.repository.ts';
import { choosePlan } from '../../../src/features/trial/plan.service.ts';
import { toBrief } from '../../../src/features/trial/to-brief.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import { findTrialOf } from '../../../src/features/trial/trial-reader.service.ts';
import { proposePlans } from '../../../src/lib/doe/index.ts';
import { type ActivityRow, checkActivityChain, listActivity } from '../../../src/server/db/activity-log.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { newId } from '../../../src/server/ids.ts';
import { admin, buildShopWithAdmin, describeAna, newAddress } from '../people/people-fixture.ts';
import { allFigures, type BoardScene, buildBoard } from '../run/run-fixture.ts';
import { buildDraft } from '../trial/trial-fixture.ts';
import { buildJudgedTrial, buildStand } from './audit-fixture.ts';

interface Change {
  kind: string;
  before: unknown;
  after: unknown;
}

/** What the newest line of this kind says stood before and stands after. */
async function changeIn(scope: ShopScope, kind: string): Promise<Change> {
  const lines: ActivityRow[] = await listActivity(scope, { limit: 50 });
  const line = lines.find((each) => each.kind === kind);
  const { before, after } = JSON.parse(line?.details ?? '{}');
  return { kind: line?.kind ?? 'none', before, after };
}

describe('each change of a reading stands in the log with before and after:', () => {
  let scene: BoardScene;
  const runId = async (number: number) => (await scene.run(number)).id;
  const part = (result: number, at: number, value: number | null, rejects: number | null = null) => [
    result,
    at,
    value,
    rejects,
    result === 1 ? 50 : null,
  ];
  const whole = (value: number) => [part(0, 1, value), part(0, 2, value + 0.4), part(1, 1, null, 1)];

  beforeAll(async () => {
    scene = await buildBoard();
  });

  const record = (number: number, figures: unknown) => scene.doRun(number, { event: 'record', figures });
  const doubt = async (number: number) =>
    recordRun(scene.shop.scope, {
      runId: await runId(number),
      figures: [
        { result: 0, part: 1, value: 400, rejects: null, lot: null },
        { result: 0, part: 2, value: 401, rejects: null, lot: null },
        { result: 1, part: 1, value: null, rejects: 1, lot: 50 },
      ],
      end: 'measured',
      isDoubted: true,
      submission: newId(),
      source: 'text',
      enteredBy: null,
    });
  const odd = [part(0, 1, 400), part(0, 2, 401), part(1, 1, null, 1)];

  const steps: [what: string, kind: string, before: unknown, after: unknown, act: () => Promise<unknown>][] =
    [
      ['a first part', 'run.recorded', [], [part(0, 1, 36)], () => record(1, allFigures(36).slice(0, 1))],
      [
        'the rest of a run',
        'run.recorded',
        [part(0, 1, 36)],
        [part(0, 1, 36), part(0, 2, 36.4), part(1, 1, null, 1)],
        () => record(1, allFigures(36).slice(1)),
      ],
      [
        'a correction',
        'reading.corrected',
        whole(36),
        whole(38),
        () => scene.doRun(1, { event: 'correct', figures: allFigures(38), reason: 'Misread' }),
      ],
      [
        'a correction to no figure',
        'reading.corrected',
        whole(38),
        [],
        () => scene.doRun(1, { event: 'correct', end: 'failed', figures: [], reason: 'No part was made' }),
      ],
      ['an odd reading', 'run.recorded', [], odd, () => doubt(2)],
      [
        'an odd reading that is right',
        'reading.confirmed',
        [],
        odd,
        () => scene.doRun(2, { event: 'confirm' }),
      ],
      ['another odd one', 'run.recorded', [], odd, () => doubt(3)],
      ['an odd reading that is wrong', 'reading.denied', [], [], () => scene.doRun(3, { event: 'deny' })],
      ['a part', 'run.recorded', [], [part(0, 1, 36)], () => record(4, allFigures(36).slice(0, 1))],
      ['a skipped run', 'run.skipped', [part(0, 1, 36)], [], () => scene.doRun(4, { event: 'skip' })],
      [
        'a reading set apart',
        'reading.set-apart',
        [],
        [part(0, 1, 37)],
        async () => {
          const id = await runId(5);
          await inTransaction(scene.shop.scope, async (inner) => {
            const run = await findRun(inner, id);
            const figures = [{ result: 0, part: 1, value: 37, rejects: null, lot: null }];
            const from = { submission: newId(), source: 'text', enteredBy: null } as const;
            if (run) await setApart(inner, run, figures, from);
          });
        },
      ],
    ];

  it.each(steps)('%s', async (_what, kind, before, after, act) => {
    await act();
    expect(await changeIn(scene.shop.scope, kind)).toEqual({ kind, before, after });
    expect(await checkActivityChain(scene.shop.scope)).toMatchObject({ intact: true });
  });
});

describe('each change of a plan stands in the log with before and after:', () => {
  it('the first choice, and another one', async () => {
    const { shop } = await buildBoard();
    const trialId = await buildDraft(shop);
    const read = toBrief((await readStoredAnswers(shop.scope, trialId)).answers);
    if ('problems' in read) throw new Error('the answers do not make a brief');
    const hashes: unknown[] = [null];
    for (const { id: proposalId } of proposePlans(read.brief).slice(0, 2)) {
      const { revision } = await findTrialOf(shop.scope, trialId);
      await choosePlan(shop.scope, { trialId, proposalId, revision }, shop.dana);
      const { before, after } = await changeIn(shop.scope, 'trial.plan-chosen');
      expect(before).toBe(hashes.at(-1));
      hashes.push(after);
    }
    const stored: unknown[] = await shop.scope
      .db('plans')
      .where({ trial_id: trialId })
      .orderBy('n')
      .pluck('hash');
    expect(hashes).toEqual([null, ...stored]);
    expect(new Set(hashes).size).toBe(3);
  });

  it('check runs', async () => {
    const { scope, reader } = await buildStand();
    const trialId = await buildJudgedTrial({ scope, reader });
    const { revision } = await findTrialOf(scope, trialId);
    await carryOutEvent(scope, { trialId, body: { event: 'plan check runs', revision } }, reader);
    const [before, after] = await scope.db('plans').where({ trial_id: trialId }).orderBy('n').pluck('hash');
    expect(await changeIn(scope, 'trial.check-runs')).toEqual({ kind: 'trial.check-runs', before, after });
  });
});

describe('each change of a role stands in the log with before and after:', () => {
  it('added, changed, erased, brought in with others', async () => {
    const { scope } = await buildShopWithAdmin();
    const email = newAddress('ana');
    const ana = await addPerson(scope, describeAna({ roles: ['operator', 'supervisor'], email }), admin);
    expect(await changeIn(scope, 'person.added')).toMatchObject({
      before: [],
      after: ['operator', 'supervisor'],
    });
    const { id, revision } = ana;
    const changed = await changePerson(scope, { id, input: { revision, roles: ['engineer'] } }, admin);
    expect(await changeIn(scope, 'person.roles-changed')).toMatchObject({
      before: expect.arrayContaining(['operator', 'supervisor']),
      after: ['engineer'],
    });
    await erasePerson(scope, { id, revision: changed.revision }, admin);
    expect(await changeIn(scope, 'person.erased')).toMatchObject({ before: ['engineer'], after: [] });

    const file = Buffer.from(`name,email,language,role\nIvo Bern,${newAddress('ivo')},en,engineer\n`);
    const { digest } = await previewImport(scope, file);
    await importPeople(scope, file, digest);
    const [line] = await listActivity(scope, { limit: 1 });
    expect(JSON.parse(line?.details ?? '{}')).toMatchObject({
      count: 1,
      signingIn: [{ before: [], after: ['engineer'] }],
    });
  });
});
