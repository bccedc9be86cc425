import { describe, expect, it } from 'vitest';
import { choosePlan } from '../../../src/features/trial/plan.service.ts';
import { publicAnswersSchema } from '../../../src/features/trial/saved-answers.schema.ts';
import { toBrief } from '../../../src/features/trial/to-brief.ts';
import { layOutRuns, proposePlans } from '../../../src/lib/doe/index.ts';
import { refusalOf } from '../people/people-fixture.ts';
import {
  answersFor,
  buildDraft,
  buildPlanned,
  buildTrialShop,
  choose,
  read,
  recommendedPlan,
  save,
  typedAnswers,
} from './trial-fixture.ts';

describe('choosing a plan', () => {
  it('works the plan out from the stored answers, draws an order and keeps both', async () => {
    const shop = await buildTrialShop();
    const id = await buildDraft(shop);
    const { plan, revision } = await choose(shop, id);
    const brief = toBrief(await typedAnswers(shop, id));
    if ('problems' in brief) throw new Error('no brief');
    const proposal = proposePlans(brief.brief).find((each) => each.id === plan?.proposalId);
    expect(plan).toMatchObject({ n: 1, fits: true, settingIds: ['temp', 'dwell', 'film'], proposal });
    const row = await shop.scope.db('plans').where({ trial_id: id }).first();
    if (!proposal) throw new Error('no proposal');
    const runs = layOutRuns(brief.brief, proposal, Number(row?.seed));
    expect(plan?.runs.map(({ coded, planned }) => ({ coded, planned }))).toEqual(
      runs.map(({ coded, actual }) => ({ coded, planned: actual })),
    );
    expect(plan?.hardest.length).toBeGreaterThan(0);
    for (const { ends } of plan?.hardest ?? [])
      expect(ends['temp'] === 'high' && ends['dwell'] === 'high').toBe(false);
    // What was sent before answers again with another order and the next number.
    const again = await choose(shop, id);
    expect(again.plan?.n).toBe(2);
    expect(again.revision).toBe(revision + 1);
    // A full plan's resolution travels and comes back.
    const travelled = publicAnswersSchema.parse(JSON.parse(JSON.stringify(again)));
    expect(travelled.plan?.proposal).toEqual(again.plan?.proposal);
  });

  it('refuses a choice that is not there, answers that are not complete, and an older state', async () => {
    const shop = await buildTrialShop();
    const id = await buildDraft(shop);
    expect((await refusalOf(choose(shop, id, 'sent plan'))).fields).toEqual([
      { pointer: '#/proposalId', code: 'not-a-choice' },
    ]);
    const { revision } = await read(shop, id);
    const proposalId = await recommendedPlan(shop, id);
    const old = choosePlan(shop.scope, { trialId: id, proposalId, revision: revision + 1 }, shop.dana);
    expect((await refusalOf(old)).code).toBe('changed-meanwhile');
    await save(shop, id, 'worth', { change: 'some' });
    expect((await refusalOf(choose(shop, id, proposalId))).fields).toEqual([
      { pointer: '#/worth/change', code: 'not-a-number' },
    ]);
    await save(shop, id, 'worth', { change: '3' });
    await save(shop, id, 'spare', { hours: '0.1' });
    expect((await refusalOf(choose(shop, id, proposalId))).fields).toEqual([
      { pointer: '#/proposalId', code: 'no-plan-fits' },
    ]);
  });

  it('no longer fits when an answer behind it changes, and fits again when it is put back', async () => {
    const shop = await buildTrialShop();
    const id = await buildPlanned(shop);
    expect((await read(shop, id)).plan?.fits).toBe(true);
    await save(shop, id, 'parts', { fate: 'throwAway' });
    expect((await read(shop, id)).plan?.fits).toBe(true);
    await save(shop, id, 'worth', { change: '4' });
    expect((await read(shop, id)).plan?.fits).toBe(false);
    await save(shop, id, 'worth', { change: '3,50' });
    expect((await read(shop, id)).plan?.fits).toBe(true);
    await save(shop, id, 'worth', { change: '' });
    expect((await read(shop, id)).plan?.fits).toBe(false);
  });

  it('never holds a mix that was ruled out on the last page', async () => {
    const shop = await buildTrialShop();
    const id = await buildDraft(shop, answersFor(shop, { neverRun: { mixes: [] } }));
    const first = await choose(shop, id);
    const ends = first.plan?.hardest[0]?.ends ?? {};
    await save(shop, id, 'look', { mixes: [{ ends, decision: 'ruledOut' }] });
    expect((await read(shop, id)).plan?.fits).toBe(false);
    const { plan } = await choose(shop, id);
    const ruledOut = ['temp', 'dwell', 'film'].map((setting) => (ends[setting] === 'high' ? 1 : -1));
    expect(plan?.fits).toBe(true);
    expect(plan?.runs.some(({ coded }) => coded.join() === ruledOut.join())).toBe(false);
  });
});
