import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { type ModelSpec, modelSpecSchema } from './model.schema.ts';

const modelRow = z.object({
  id: z.string(),
  trial_id: z.string(),
  name: z.string(),
  spec: jsonColumn(z.object({ v: z.literal(1), spec: modelSpecSchema })),
  input_hash: z.string(),
  made_by: z.string(),
  updated_at: moment,
});

export interface StoredModel {
  id: string;
  trialId: string;
  name: string;
  spec: ModelSpec;
  inputHash: string;
  madeBy: string;
  at: number;
}

function toModel(row: unknown): StoredModel {
  const { trial_id, spec, input_hash, made_by, updated_at, ...rest } = modelRow.parse(row);
  return {
    ...rest,
    trialId: trial_id,
    spec: spec.spec,
    inputHash: input_hash,
    madeBy: made_by,
    at: updated_at,
  };
}

/** The models of a trial, in the order in which they were made. */
export async function listModels(scope: ShopScope, trialId: string): Promise<StoredModel[]> {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  const rows: unknown[] = await scope.db('models').where(own).orderBy(['created_at', 'id']);
  return rows.map(toModel);
}

export async function findModel(scope: ShopScope, trialId: string, id: string): Promise<StoredModel | null> {
  const row: unknown = await scope
    .db('models')
    .where({ shop_id: scope.shopId, trial_id: trialId, id })
    .first();
  return row ? toModel(row) : null;
}

type Written = Omit<StoredModel, 'at'>;

/** @returns false when the id is taken */
export async function insertModel(scope: ShopScope, model: Written): Promise<boolean> {
  const at = now();
  const added = await scope
    .db('models')
    .insert({
      id: model.id,
      shop_id: scope.shopId,
      trial_id: model.trialId,
      name: model.name,
      spec: JSON.stringify({ v: 1, spec: model.spec }),
      input_hash: model.inputHash,
      made_by: model.madeBy,
      created_at: at,
      updated_at: at,
    })
    .onConflict('id')
    .ignore()
    .returning('id');
  return added.length > 0;
}

export async function updateModel(scope: ShopScope, model: Written): Promise<void> {
  await scope
    .db('models')
    .where({ shop_id: scope.shopId, trial_id: model.trialId, id: model.id })
    .update({
      name: model.name,
      spec: JSON.stringify({ v: 1, spec: model.spec }),
      input_hash: model.inputHash,
      made_by: model.madeBy,
      updated_at: now(),
    });
}

export async function deleteModel(scope: ShopScope, trialId: string, id: string): Promise<boolean> {
  const gone = await scope.db('models').where({ shop_id: scope.shopId, trial_id: trialId, id }).delete();
  return gone > 0;
}
