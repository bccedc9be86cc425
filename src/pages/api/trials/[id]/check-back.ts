import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { checkBackSchema } from '../../../../features/verdict/check-back.schema.ts';
import { answerCheckBack } from '../../../../features/verdict/check-back.service.ts';
import { defineEndpoint, nothing } from '../../../../server/http/define-endpoint.ts';

export const POST = defineEndpoint(
  { access: 'decide', params: trialParamsSchema, body: checkBackSchema, output: nothing },
  ({ scope, viewer, params, body }) =>
    answerCheckBack(scope, { ...body, trialId: params.id }, viewer).then(() => undefined),
);
