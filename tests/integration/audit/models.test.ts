import { describe, expect, it } from 'vitest';
import type { ModelSpec } from '../../../src/features/audit/model.schema.ts';
import { readModels, removeModel, saveModel } from '../../../src/features/audit/model.service.ts';
import { readAuditModel } from '../../../src/features/audit/read-model.service.ts';
import { readLookedAt, readModelsView } from '../../../src/features/audit/read-models.service.ts';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { readVerdict } from '../../../src/features/verdict/read-verdict.service.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildMeasuredTrial, buildRunningTrial, type ReadRun } from '../../builders/measured-trial.ts';
import { refusalOf } from '../people/people-fixture.ts';
import { buildTrialShop } from '../trial/trial-fixture.ts';

const hotter: ReadRun = ({ coded, order }) => 35 + 4 * (coded[0] ?? 0) + 0.55 * Math.sin(order * 12.9898);

const plain: ModelSpec = {
  result: 0,
  terms: ['A', 'B'],
  refuseHierarchy: false,
  transform: { kind: 'none' },
  without: [],
  stretchesAsBlocks: false,
  error: 'residual',
};

async function setTheScene() {
  const shop = await buildTrialShop();
  const sam = await shop.add(['engineer'], { name: 'Sam' });
  const scope = shop.as(sam);
  const trialId = await buildMeasuredTrial(shop.scope, { ownerId: shop.dana.personId, read: hotter });
  await makeVerdict(shop.scope, trialId);
  const save = (name: string, change: Partial<ModelSpec> = {}, id = newId()) =>
    saveModel(scope, { trialId, id, name, spec: { ...plain, ...change } }, sam);
  return { shop, scope, sam, trialId, save };
}

describe('an engineer’s model', () => {
  it('is kept, shown beside the trial’s own, and changes nothing that the supervisor sees', async () => {
    const { shop, scope, trialId, save } = await setTheScene();
    const verdict = () => readVerdict(shop.scope, { trialId, language: 'en' }, shop.dana);
    const before = JSON.stringify(await verdict());
    const saved = await save('Two factors on logarithms', { transform: { kind: 'log' } });
    expect(saved).toMatchObject({ name: 'Two factors on logarithms', by: 'Sam' });
    const view = await readModelsView(scope, trialId, {});
    if (typeof view === 'string') throw new Error(view);
    const [own, other] = view.models;
    expect(own?.id).toBeNull();
    expect(other?.analysis?.terms.map(({ term }) => term)).toEqual(['A', 'B']);
    expect(other?.analysis?.error.source).toBe('residual');
    expect(other?.analysis?.intercept.coefficient).toBeCloseTo(Math.log(35), 1);
    const looked = await readLookedAt(scope, trialId, { model: saved.id });
    expect(looked).toMatchObject({ name: 'Two factors on logarithms', verdict: null });
    expect(JSON.stringify(await verdict())).toBe(before);
    expect(await readAuditModel(scope, trialId)).toMatchObject({ verdict: { n: 1, agrees: 'same' } });
  });

  it('leaves a run out with its reason, which the log does not repeat', async () => {
    const { shop, scope, trialId, save } = await setTheScene();
    const { id } = await save('Without run 2', { without: [{ run: 2, reason: 'the jaw was cold' }] });
    const view = await readLookedAt(scope, trialId, { model: id });
    if (typeof view === 'string') throw new Error(view);
    expect(view.input.runs.filter(({ y }) => y === null)).toHaveLength(1);
    const lines = await shop.scope.db('activity').where({ shop_id: scope.shopId, kind: 'model.saved' });
    expect(lines).toHaveLength(1);
    expect(lines[0].details).toContain('"without":[2]');
    expect(lines[0].details).not.toContain('cold');
  });

  it('is changed and removed under its id, each on record with before and after', async () => {
    const { shop, scope, trialId, save } = await setTheScene();
    const { id } = await save('Mine');
    await save('Mine', { terms: ['A'] }, id);
    expect((await readModels(scope, trialId)).map(({ spec }) => spec.terms)).toEqual([['A']]);
    await removeModel(scope, { trialId, id });
    expect(await readModels(scope, trialId)).toEqual([]);
    const lines = await shop.scope
      .db('activity')
      .where({ shop_id: scope.shopId, trial_id: trialId })
      .whereLike('kind', 'model.%')
      .orderBy('seq');
    expect(lines.map(({ kind }) => kind)).toEqual(['model.saved', 'model.saved', 'model.removed']);
    expect(JSON.parse(lines[1].details)).toMatchObject({
      before: { terms: ['A', 'B'] },
      after: { terms: ['A'] },
    });
  });

  it('is refused where it does not fit, naming the place', async () => {
    const { save, trialId, scope, shop } = await setTheScene();
    await save('Mine');
    const refusals: [Promise<unknown>, string, string][] = [
      [save('Mine'), '#/name', 'taken'],
      [save('Other letters', { terms: ['G'] }), '#/spec/terms', 'does-not-fit'],
      [save('No such result', { result: 3 }), '#/spec/result', 'does-not-fit'],
      [
        save('No such run', { without: [{ run: 99, reason: 'gone' }] }),
        '#/spec/without/0/run',
        'does-not-fit',
      ],
    ];
    for (const [work, pointer, code] of refusals)
      expect((await refusalOf(work)).fields).toEqual([{ pointer, code }]);
    const run = await shop.scope.db('runs').where({ shop_id: scope.shopId, trial_id: trialId }).first();
    await shop.scope.db('readings').where({ run_id: run.id }).update({ value: -1 });
    const negative = await refusalOf(save('Logarithms', { transform: { kind: 'log' } }));
    expect(negative.fields).toEqual([{ pointer: '#/spec/transform', code: 'off-scale' }]);
  });

  it('waits until the runs are made, and is of no other shop', async () => {
    const { shop, sam, scope, save, trialId } = await setTheScene();
    const running = await buildRunningTrial(shop.scope, { ownerId: shop.dana.personId });
    const early = saveModel(scope, { trialId: running, id: newId(), name: 'Early', spec: plain }, sam);
    expect((await refusalOf(early)).code).toBe('not-now');
    expect(await readAuditModel(scope, running)).toBe('not-in');
    const { id } = await save('Mine');
    const other = await buildTrialShop();
    expect((await refusalOf(readModels(other.scope, trialId))).code).toBe('not-found');
    expect((await refusalOf(removeModel(other.scope, { trialId, id }))).code).toBe('not-found');
  });
});
