import { describe, expect, it } from 'vitest';
import { listPhrases } from '../../../src/features/trial/phrase.repository.ts';
import { findLatestPlan } from '../../../src/features/trial/plan.repository.ts';
import { layOutPlan } from '../../../src/features/trial/plan.service.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { refusalOf } from '../people/people-fixture.ts';
import {
  act,
  answersFor,
  buildDraft,
  buildPlanned,
  buildTrialShop,
  choose,
  decide,
  noHazard,
  read,
  save,
  type TrialShop,
} from './trial-fixture.ts';

async function ready(shop: TrialShop) {
  const sam = await shop.add(['engineer']);
  const id = await buildPlanned(shop);
  await act(shop, id, 'send for review');
  await decide(shop, id, 'approve', sam);
  return { id, sam };
}

describe('starting a trial', () => {
  it('writes the runs exactly as the plan lays them out, all waiting, and freezes what they stand on', async () => {
    const shop = await buildTrialShop();
    const { id } = await ready(shop);
    const started = await act(shop, id, 'start');
    expect(started).toMatchObject({ state: 'running', mayWrite: false, review: { holds: true } });
    const plan = await findLatestPlan(shop.scope, id);
    if (!plan) throw new Error('no plan');
    const rows = await shop.scope.db('runs').where({ trial_id: id }).orderBy('number');
    expect(rows.map((row) => [row.number, row.place, row.block, row.group_key, Boolean(row.center)])).toEqual(
      layOutPlan(plan).map((run) => [run.order, run.order, run.block, run.group, run.center]),
    );
    expect(rows.map((row) => [JSON.parse(row.coded).x, JSON.parse(row.planned).values])).toEqual(
      layOutPlan(plan).map((run) => [run.coded, run.actual]),
    );
    for (const row of rows) {
      expect(row).toMatchObject({
        state: 'waiting',
        plan_id: plan.id,
        person_id: shop.anaId,
        measurer_id: shop.anaId,
      });
    }
    const stretches = await shop.scope.db('stretches').where({ trial_id: id });
    expect(stretches).toMatchObject([{ n: 1, kind: 'start' }]);
    const answers = await shop.scope.db('answers').where({ trial_id: id }).first();
    const [line] = await listActivity(shop.scope, { limit: 1, trialId: id });
    expect(line?.kind).toBe('trial.started');
    expect(JSON.parse(line?.details ?? '{}')).toMatchObject({
      answers: answers?.frozen_hash,
      plan: plan.hash,
      runs: rows.length,
      unchecked: false,
    });
    expect((await refusalOf(act(shop, id, 'start'))).code).toBe('not-now');
  });

  it('goes straight from the draft where the rules ask nobody', async () => {
    for (const [rule, hazards, code] of [
      ['hazard', noHazard, null],
      ['never', {}, null],
      ['hazard', {}, 'not-now'],
      ['always', noHazard, 'not-now'],
    ] as const) {
      const shop = await buildTrialShop({ plan_review: rule });
      await shop.add(['engineer']);
      const id = await buildPlanned(shop, hazards);
      if (code === null) expect((await act(shop, id, 'start')).state).toBe('running');
      else expect((await refusalOf(act(shop, id, 'start'))).code).toBe(code);
    }
  });

  it('waits for the engineer where a hard mix was left to them, whatever the rules say', async () => {
    const shop = await buildTrialShop({ plan_review: 'never' });
    await shop.add(['engineer']);
    const id = await buildPlanned(shop, noHazard);
    const { plan } = await read(shop, id);
    const mixes = plan?.hardest.map(({ ends }) => ({ ends, decision: 'engineerAgrees' as const })) ?? [];
    await save(shop, id, 'look', { mixes });
    expect((await read(shop, id)).secondPerson).toBe('needed');
    expect((await refusalOf(act(shop, id, 'start'))).code).toBe('not-now');
  });

  it('says that nobody else checked it where there is nobody else, and stops where there is nobody at all', async () => {
    const shop = await buildTrialShop();
    const id = await buildPlanned(shop);
    expect((await read(shop, id)).secondPerson).toBe('missing');
    expect((await refusalOf(act(shop, id, 'start'))).code).toBe('no-reviewer');
    const alone = await shop.add(['supervisor'], { safety_person: true });
    expect((await read(shop, id, alone)).secondPerson).toBe('alone');
    expect((await read(shop, id)).secondPerson).toBe('needed');
    expect((await refusalOf(act(shop, id, 'start'))).code).toBe('not-now');
    const started = await act(shop, id, 'start', alone);
    expect(started).toMatchObject({
      state: 'running',
      review: { state: 'unchecked', decidedBy: null, round: 1 },
    });
    const kinds = (await listActivity(shop.scope, { limit: 5, trialId: id })).map(({ kind }) => kind);
    expect(kinds).toContain('review.skipped');
  });

  it('names all that is missing: mixes nobody looked at, a plan, the list, people who left, words nobody could read', async () => {
    const shop = await buildTrialShop();
    const own = { picked: [], own: { en: 'Film tears' } };
    const id = await buildDraft(shop, answersFor(shop, { ...noHazard, stop: own, ready: { ticked: [] } }));
    const bare = await refusalOf(act(shop, id, 'start'));
    expect(bare.fields.map(({ pointer, code }) => `${pointer} ${code}`)).toEqual([
      '#/ready/ticked tick-all',
      '#/stop/own/es version-missing',
      '#/plan choose-plan',
    ]);
    await choose(shop, id);
    await save(shop, id, 'ready', answersFor(shop).ready ?? { ticked: [] });
    await save(shop, id, 'stop', { picked: [], own: { en: 'Film tears', es: 'La película se rompe' } });
    expect((await refusalOf(act(shop, id, 'start'))).fields).toEqual([
      { pointer: '#/look', code: 'decide-mix' },
    ]);
    await shop.scope.db('people').where({ id: shop.anaId }).update({ active: false });
    expect((await refusalOf(act(shop, id, 'start'))).fields[0]).toEqual({
      pointer: '#/crew/shifts/0/runs',
      code: 'person-gone',
    });
    expect(await shop.scope.db('runs').where({ trial_id: id })).toEqual([]);
  });

  it('keeps own stop rules in the word list, once', async () => {
    const shop = await buildTrialShop();
    const texts = { en: 'Film tears', es: 'La película se rompe' };
    for (let round = 0; round < 2; round++) {
      const id = await buildPlanned(shop, { ...noHazard, stop: { picked: [], own: texts } });
      await act(shop, id, 'start');
    }
    expect((await listPhrases(shop.scope, 'stop rule')).map((phrase) => phrase.texts)).toEqual([texts]);
  });

  it('leaves who runs open where shifts differ, and gives each number once to two who start at once', async () => {
    const shop = await buildTrialShop();
    const { personId } = await shop.add(['operator']);
    const shifts = [
      { id: 'day', runs: shop.anaId, measures: personId },
      { id: 'night', runs: personId },
    ];
    const id = await buildPlanned(shop, { ...noHazard, crew: { shifts } });
    const outcomes = await Promise.allSettled([act(shop, id, 'start'), act(shop, id, 'start')]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    const rows = await shop.scope.db('runs').where({ trial_id: id });
    expect(new Set(rows.map(({ number }) => number)).size).toBe(rows.length);
    for (const row of rows) expect(row).toMatchObject({ person_id: null, measurer_id: personId });
  });
});
