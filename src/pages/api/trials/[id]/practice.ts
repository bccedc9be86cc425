import { z } from 'zod';
import { practiceSchema } from '../../../../features/trial/texts-preview.schema.ts';
import { sendPractice } from '../../../../features/trial/texts-preview.service.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** Run 1 to the caller's own phone; it does not count. */
export const POST = defineEndpoint(
  { access: 'trial.write', params: trialParamsSchema, body: z.strictObject({}), output: practiceSchema },
  ({ scope, viewer, params }) => sendPractice(scope, params.id, viewer),
);
