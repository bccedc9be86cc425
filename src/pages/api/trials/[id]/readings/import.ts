import {
  readingsImportQuerySchema,
  readingsPreviewSchema,
} from '../../../../../features/run/readings-file.schema.ts';
import { importReadings, previewReadings } from '../../../../../features/run/readings-file.service.ts';
import { trialParamsSchema } from '../../../../../features/trial/trial.schema.ts';
import { AppError } from '../../../../../server/errors.ts';
import { defineEndpoint } from '../../../../../server/http/define-endpoint.ts';
import { wakeWorker } from '../../../../../server/wake.ts';

/** The file itself is the body, as `text/csv`: its digest is that of its bytes. */
export const POST = defineEndpoint(
  {
    access: 'run.record',
    params: trialParamsSchema,
    query: readingsImportQuerySchema,
    output: readingsPreviewSchema,
  },
  async ({ scope, viewer, params, query, context }) => {
    const contentType = context.request.headers.get('content-type') ?? '';
    if (!/^text\/csv\b/i.test(contentType)) throw new AppError('wrong-content-type');
    const bytes = new Uint8Array(await context.request.arrayBuffer());
    if (query.preview) return previewReadings(scope, params.id, bytes);
    const file = { trialId: params.id, bytes, previewed: query.digest };
    const answer = await importReadings(scope, file, viewer);
    wakeWorker();
    return answer;
  },
);
