import {
  modelParamsSchema,
  newModelParamsSchema,
  publicModelSchema,
  saveModelSchema,
} from '../../../../../features/audit/model.schema.ts';
import { readModel, removeModel, saveModel } from '../../../../../features/audit/model.service.ts';
import { defineEndpoint, nothing } from '../../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'audit.read', params: modelParamsSchema, output: publicModelSchema, byToken: true },
  ({ scope, params }) => readModel(scope, params.id, params.model),
);

/** The id is the client's own: sent twice, it makes one model. */
export const PUT = defineEndpoint(
  {
    access: 'model.write',
    params: newModelParamsSchema,
    body: saveModelSchema,
    output: publicModelSchema,
  },
  ({ scope, viewer, params, body }) =>
    saveModel(scope, { ...body, trialId: params.id, id: params.model }, viewer),
);

export const DELETE = defineEndpoint(
  { access: 'model.write', params: modelParamsSchema, output: nothing },
  ({ scope, params }) => removeModel(scope, { trialId: params.id, id: params.model }),
);
