import { listTerms } from '../../lib/doe/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { listFactors } from './audit-factors.ts';
import type { AuditModelView } from './audit-view.ts';
import type { AuditLook } from './frame/audit-parts.ts';
import type { PublicModel } from './model.schema.ts';
import { readModel, readModels } from './model.service.ts';
import type { ComparedModel, ModelsView } from './models/compared-model.ts';
import { isJudged } from './read-frame.service.ts';
import { type NoModel, readAuditModel } from './read-model.service.ts';
import { type ModelBasis, readModelBasis, workOutModel } from './work-out-model.service.ts';

/** Interactions of more than three factors are not offered: nobody could name what they mean. */
const highestOrder = 3;

function compare(basis: ModelBasis, model: PublicModel): ComparedModel {
  const shown = { id: model.id, name: model.name, spec: model.spec, by: model.by };
  const isStale = model.inputHash !== basis.inputHash;
  try {
    const { analysis, added } = workOutModel(basis, model.spec);
    return { ...shown, analysis, added, isStale };
  } catch (error) {
    // Readings that came since may have no place on its scale.
    if (!(error instanceof AppError) || error.code !== 'invalid') throw error;
    return { ...shown, analysis: null, added: [], isStale };
  }
}

/** All models of one result side by side. @throws AppError `not-found`, for another shop's trial too */
export async function readModelsView(
  scope: ShopScope,
  trialId: string,
  { result = 0 }: AuditLook,
): Promise<ModelsView | NoModel> {
  const own = await readAuditModel(scope, trialId, { result });
  if (typeof own === 'string') return own;
  const basis = await readModelBasis(scope, trialId);
  const stored = (await readModels(scope, trialId)).filter(({ spec }) => spec.result === result);
  return {
    result,
    kind: own.spec.kind,
    factors: own.factors,
    models: [
      { id: null, name: '', spec: null, by: '', analysis: own.analysis, added: [], isStale: false },
      ...stored.map((model) => compare(basis, model)),
    ],
    terms: listTerms(
      own.factors.map(({ letter }) => letter),
      highestOrder,
    ),
    runNumbers: own.runNumbers,
    stretches: new Set(basis.stretches).size,
    stored,
  };
}

/**
 * The model that an address asks for: an engineer's where it names one, else the trial's own.
 * @throws AppError `not-found`, `invalid` where an engineer's model cannot be worked out any more
 */
export async function readLookedAt(
  scope: ShopScope,
  trialId: string,
  look: AuditLook,
): Promise<AuditModelView | NoModel> {
  if (look.model === undefined) return readAuditModel(scope, trialId, look);
  const trial = await findTrialOf(scope, trialId);
  if (!(await isJudged(scope, trial))) return 'not-in';
  const model = await readModel(scope, trialId, look.model);
  const basis = await readModelBasis(scope, trialId);
  const { found, input, analysis } = workOutModel(basis, model.spec);
  return {
    spec: found.spec,
    result: model.spec.result,
    factors: listFactors(basis.judged.brief),
    brief: basis.judged.brief,
    input,
    analysis,
    transform: model.spec.transform,
    runNumbers: basis.judged.runs.map(({ number }) => number),
    name: model.name,
    inputHash: basis.inputHash,
    verdict: null,
  };
}
