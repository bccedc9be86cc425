import { readAnswers } from '../../../../features/trial/answers.service.ts';
import { choosePlan } from '../../../../features/trial/plan.service.ts';
import { publicAnswersSchema } from '../../../../features/trial/saved-answers.schema.ts';
import { choosePlanSchema, trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** Only the choice travels: the plan itself is worked out from the stored answers. */
export const POST = defineEndpoint(
  {
    access: 'trial.write',
    params: trialParamsSchema,
    body: choosePlanSchema,
    output: publicAnswersSchema,
  },
  async ({ scope, viewer, params, body }) => {
    await choosePlan(scope, { ...body, trialId: params.id }, viewer);
    return readAnswers(scope, params.id, viewer);
  },
);
