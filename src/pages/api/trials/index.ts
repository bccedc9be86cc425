import { listTrialsSchema, trialsPageSchema } from '../../../features/trial/trial.schema.ts';
import { listTrials } from '../../../features/trial/trial.service.ts';
import { defineEndpoint } from '../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'trial.read', byToken: true, query: listTrialsSchema, output: trialsPageSchema },
  ({ scope, query }) => listTrials(scope, query),
);
