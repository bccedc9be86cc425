import { z } from 'zod';
import { trialParamsSchema } from '../../../../../features/trial/trial.schema.ts';
import { madeShareSchema } from '../../../../../features/verdict/share.schema.ts';
import { shareVerdict } from '../../../../../features/verdict/share.service.ts';
import { defineEndpoint } from '../../../../../server/http/define-endpoint.ts';

export const POST = defineEndpoint(
  {
    access: 'share.manage',
    params: trialParamsSchema,
    body: z.strictObject({}),
    output: madeShareSchema,
    status: 201,
  },
  ({ scope, params }) => shareVerdict(scope, params.id),
);
