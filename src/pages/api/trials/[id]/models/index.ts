import { modelsSchema, trialModelsParamsSchema } from '../../../../../features/audit/model.schema.ts';
import { readModels } from '../../../../../features/audit/model.service.ts';
import { defineEndpoint } from '../../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'audit.read', params: trialModelsParamsSchema, output: modelsSchema, byToken: true },
  async ({ scope, params }) => ({ models: await readModels(scope, params.id) }),
);
