import { importedTrialSchema } from '../../../features/audit/pack/imported-trial.schema.ts';
import { trialFileSchema } from '../../../features/audit/pack/trial-file.schema.ts';
import { importTrial } from '../../../features/trial/import-trial.service.ts';
import { defineEndpoint } from '../../../server/http/define-endpoint.ts';

/** Brings in a trial that was taken out of any shop as trial.json. */
export const POST = defineEndpoint(
  { access: 'trial.import', body: trialFileSchema, output: importedTrialSchema, status: 201 },
  ({ scope, viewer, body }) => importTrial(scope, body, viewer),
);
