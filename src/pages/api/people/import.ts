import { importPreviewSchema, importQuerySchema } from '../../../features/people/import.schema.ts';
import { importPeople, previewImport } from '../../../features/people/import.service.ts';
import { AppError } from '../../../server/errors.ts';
import { defineEndpoint } from '../../../server/http/define-endpoint.ts';

/** The file itself is the body, as `text/csv`: its digest is that of its bytes. */
export const POST = defineEndpoint(
  { access: 'people.manage', query: importQuerySchema, output: importPreviewSchema },
  async ({ scope, query, context }) => {
    const contentType = context.request.headers.get('content-type') ?? '';
    if (!/^text\/csv\b/i.test(contentType)) throw new AppError('wrong-content-type');
    const bytes = new Uint8Array(await context.request.arrayBuffer());
    return query.preview ? previewImport(scope, bytes) : importPeople(scope, bytes, query.digest);
  },
);
