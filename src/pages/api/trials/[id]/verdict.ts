import { verdictAnswerSchema } from '../../../../features/audit/api/token-answers.schema.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { findTrialOf } from '../../../../features/trial/trial-reader.service.ts';
import { findVerdict } from '../../../../features/verdict/verdict.repository.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'verdict.read', byToken: true, params: trialParamsSchema, output: verdictAnswerSchema },
  async ({ scope, params }) => {
    const { id } = await findTrialOf(scope, params.id);
    return { trialId: id, verdict: await findVerdict(scope, id) };
  },
);
