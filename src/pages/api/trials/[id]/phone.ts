import { z } from 'zod';
import { readPhoneToCall } from '../../../../features/run/read-phone.service.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';
import { idSchema } from '../../../../server/ids.ts';

/** A number to call after a stop for safety. A change, as it is recorded: never asked for by a link. */
export const POST = defineEndpoint(
  {
    access: 'trial.read',
    params: trialParamsSchema,
    body: z.strictObject({ personId: idSchema }),
    output: z.object({ phone: z.string() }),
  },
  ({ scope, viewer, params, body }) =>
    readPhoneToCall(scope, { trialId: params.id, personId: body.personId }, viewer),
);
