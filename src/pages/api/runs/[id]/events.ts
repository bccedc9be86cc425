import {
  runAnswerSchema,
  runEventSchema,
  runParamsSchema,
} from '../../../../features/run/run-event.schema.ts';
import { carryOutRunEvent } from '../../../../features/run/run-event.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';
import { wakeWorker } from '../../../../server/wake.ts';

/** Who may do what is in the table of a run's states, which is asked for each event. */
export const POST = defineEndpoint(
  { access: 'trial.read', params: runParamsSchema, body: runEventSchema, output: runAnswerSchema },
  async ({ scope, viewer, params, body }) => {
    const answer = await carryOutRunEvent(scope, { runId: params.id, body }, viewer);
    wakeWorker();
    return answer;
  },
);
