import { z } from 'zod';
import { makePack } from '../../../../features/audit/pack.service.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { findTrialOf } from '../../../../features/trial/trial-reader.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** The audit pack of a trial, in the reader's language where people read it. */
export const GET = defineEndpoint(
  {
    access: 'pack.read',
    byToken: true,
    params: trialParamsSchema,
    output: z.unknown(),
    mediaType: 'application/zip',
  },
  async ({ scope, params, context }) => {
    const { number } = await findTrialOf(scope, params.id);
    const { t, formats, language } = context.locals;
    const pack = await makePack(scope, params.id, { t, formats, language });
    return new Response(new Uint8Array(pack), {
      headers: {
        'Content-Type': 'application/zip',
        'Content-Disposition': `attachment; filename="audit-pack-${number}.zip"`,
        'Cache-Control': 'no-store',
      },
    });
  },
);
