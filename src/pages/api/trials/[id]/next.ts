import { publicTrialSchema, trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { nextTrialSchema } from '../../../../features/verdict/next-trial.schema.ts';
import { beginNextTrial } from '../../../../features/verdict/next-trial.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const POST = defineEndpoint(
  { access: 'trial.write', params: trialParamsSchema, body: nextTrialSchema, output: publicTrialSchema },
  ({ scope, viewer, params, body }) => beginNextTrial(scope, { ...body, trialId: params.id }, viewer),
);
