import { z } from 'zod';
import { exportReadings } from '../../../../features/run/readings-file.service.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** Every run with its settings and figures, for a spreadsheet; the import reads it back. */
export const GET = defineEndpoint(
  { access: 'trial.read', byToken: true, params: trialParamsSchema, output: z.unknown() },
  async ({ scope, params }) =>
    new Response(await exportReadings(scope, params.id), {
      headers: {
        'Content-Type': 'text/csv; charset=utf-8',
        'Content-Disposition': 'attachment; filename="readings.csv"',
        'Cache-Control': 'no-store',
      },
    }),
);
