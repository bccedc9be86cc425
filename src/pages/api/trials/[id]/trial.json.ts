import { trialFileSchema } from '../../../../features/audit/pack/trial-file.schema.ts';
import { readTrialFile, writeTrialFile } from '../../../../features/audit/trial-file.service.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { findTrialOf } from '../../../../features/trial/trial-reader.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** The whole trial as a file that any shop can bring in. */
export const GET = defineEndpoint(
  { access: 'pack.read', byToken: true, params: trialParamsSchema, output: trialFileSchema },
  async ({ scope, params }) => {
    const { number } = await findTrialOf(scope, params.id);
    return new Response(writeTrialFile(await readTrialFile(scope, params.id)), {
      headers: {
        'Content-Type': 'application/json; charset=utf-8',
        'Content-Disposition': `attachment; filename="trial-${number}.json"`,
        'Cache-Control': 'no-store',
      },
    });
  },
);
