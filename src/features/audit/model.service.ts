import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { readNames } from '../people/people.repository.ts';
import { findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';
import {
  deleteModel,
  findModel,
  insertModel,
  listModels,
  type StoredModel,
  updateModel,
} from './model.repository.ts';
import type { ModelSpec, PublicModel, SaveModel } from './model.schema.ts';
import { isJudged } from './read-frame.service.ts';
import { readModelBasis, workOutModel } from './work-out-model.service.ts';

async function toPublic(scope: ShopScope, models: readonly StoredModel[]): Promise<PublicModel[]> {
  const names = await readNames(
    scope,
    models.map(({ madeBy }) => madeBy),
  );
  return models.map(({ madeBy, trialId: _, ...model }) => ({ ...model, by: names.get(madeBy) ?? '' }));
}

/** An engineer's models of a trial. @throws AppError `not-found`, for another shop's trial too */
export async function readModels(scope: ShopScope, trialId: string): Promise<PublicModel[]> {
  await findTrialOf(scope, trialId);
  return toPublic(scope, await listModels(scope, trialId));
}

/** @throws AppError `not-found` */
export async function readModel(scope: ShopScope, trialId: string, id: string): Promise<PublicModel> {
  await findTrialOf(scope, trialId);
  const model = await findModel(scope, trialId, id);
  const [shown] = model ? await toPublic(scope, [model]) : [];
  if (!shown) throw new AppError('not-found', { detail: 'no such model' });
  return shown;
}

/** For the log: no names and no reasons, which are free words. */
function logSpec({ without, transform, ...spec }: ModelSpec) {
  const lambda = transform.kind === 'boxCox' ? transform.lambda : null;
  return { ...spec, transform: transform.kind, lambda, without: without.map(({ run }) => run) };
}

/**
 * Keeps an engineer's model under its name, new or changed. It never becomes the trial's own: nobody but engineers sees it.
 * @throws AppError `not-found`, `not-now` while the runs are being made, `invalid` naming what does not fit
 */
export function saveModel(
  scope: ShopScope,
  wish: SaveModel & { trialId: string; id: string },
  reader: TrialReader,
): Promise<PublicModel> {
  return inTransaction(scope, async (inner) => {
    const { trialId, id, name, spec } = wish;
    const trial = await findTrialOf(inner, trialId);
    if (!(await isJudged(inner, trial))) throw new AppError('not-now', { detail: 'the runs are being made' });
    const known = await listModels(inner, trialId);
    if (known.some((model) => model.name === name && model.id !== id)) {
      throw new AppError('invalid', { fields: [{ pointer: '#/name', code: 'taken' }] });
    }
    const basis = await readModelBasis(inner, trialId);
    workOutModel(basis, spec);
    const before = known.find((model) => model.id === id);
    const model = { id, trialId, name, spec, inputHash: basis.inputHash, madeBy: reader.personId };
    if (before) await updateModel(inner, model);
    // The id stands for a model of another trial or shop.
    else if (!(await insertModel(inner, model))) throw new AppError('not-found', { detail: 'no such model' });
    await recordActivity(inner, {
      kind: 'model.saved',
      subjectId: id,
      trialId,
      details: { before: before ? logSpec(before.spec) : null, after: logSpec(spec) },
    });
    return readModel(inner, trialId, id);
  });
}

/** @throws AppError `not-found` */
export function removeModel(scope: ShopScope, which: { trialId: string; id: string }): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const model = await readModel(inner, which.trialId, which.id);
    await deleteModel(inner, which.trialId, which.id);
    await recordActivity(inner, {
      kind: 'model.removed',
      subjectId: which.id,
      trialId: which.trialId,
      details: { before: logSpec(model.spec) },
    });
  });
}
