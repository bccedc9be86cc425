import { readAnswers } from '../../../../features/trial/answers.service.ts';
import { publicAnswersSchema } from '../../../../features/trial/saved-answers.schema.ts';
import { trialEventSchema, trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { carryOutEvent } from '../../../../features/trial/trial-event.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';
import { wakeWorker } from '../../../../server/wake.ts';

/** Who may do what is in the table of states, which is asked for each event. */
export const POST = defineEndpoint(
  {
    access: 'trial.read',
    params: trialParamsSchema,
    body: trialEventSchema,
    output: publicAnswersSchema,
  },
  async ({ scope, viewer, params, body }) => {
    await carryOutEvent(scope, { trialId: params.id, body }, viewer);
    wakeWorker();
    return readAnswers(scope, params.id, viewer);
  },
);
