import {
  changeTrialSchema,
  createTrialSchema,
  deleteTrialQuerySchema,
  newTrialParamsSchema,
  publicTrialSchema,
  trialParamsSchema,
} from '../../../../features/trial/trial.schema.ts';
import { createTrial, deleteTrial, putAwayTrial } from '../../../../features/trial/trial.service.ts';
import { readPublicTrial } from '../../../../features/trial/trial-reader.service.ts';
import { defineEndpoint, nothing } from '../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'trial.read', params: trialParamsSchema, output: publicTrialSchema },
  ({ scope, params }) => readPublicTrial(scope, params.id),
);

/** The id is the client's own: sent twice, it makes one trial. */
export const PUT = defineEndpoint(
  {
    access: 'trial.write',
    params: newTrialParamsSchema,
    body: createTrialSchema,
    output: publicTrialSchema,
  },
  ({ scope, viewer, params, body }) => createTrial(scope, { ...body, id: params.id }, viewer),
);

export const PATCH = defineEndpoint(
  {
    access: 'trial.write',
    params: trialParamsSchema,
    body: changeTrialSchema,
    output: publicTrialSchema,
  },
  ({ scope, params, body }) => putAwayTrial(scope, { ...body, id: params.id }),
);

export const DELETE = defineEndpoint(
  { access: 'trial.write', params: trialParamsSchema, query: deleteTrialQuerySchema, output: nothing },
  ({ scope, viewer, params, query }) => deleteTrial(scope, { ...params, ...query }, viewer),
);
