import { auditAnswerSchema } from '../../../../features/audit/api/token-answers.schema.ts';
import { readTrialFile } from '../../../../features/audit/trial-file.service.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** The stored analysis behind the latest verdict: inputs, effects, tests, analysis of variance, checks of single runs. */
export const GET = defineEndpoint(
  { access: 'audit.read', byToken: true, params: trialParamsSchema, output: auditAnswerSchema },
  async ({ scope, params }) => {
    const latest = (await readTrialFile(scope, params.id)).verdicts.at(-1);
    const results = auditAnswerSchema.shape.results.parse(latest?.analysis.results ?? []);
    return { trialId: params.id, n: latest?.n ?? null, results };
  },
);
