import { z } from 'zod';
import { listEndpoints } from '../../features/audit/api/list-endpoints.ts';
import { writeOpenApi } from '../../features/audit/api/openapi.ts';
import { config } from '../../server/env.ts';
import { defineEndpoint } from '../../server/http/define-endpoint.ts';

// Read in when it is first asked for: this file is one of them.
const files = import.meta.glob('./**/*.ts');

/** What every endpoint takes and answers, written from what they check themselves against. */
export const GET = defineEndpoint(
  { access: 'audit.read', byToken: true, output: z.looseObject({ openapi: z.string() }) },
  async ({ context }) => {
    const modules: Record<string, unknown> = {};
    for (const [file, read] of Object.entries(files)) modules[file] = await read();
    return writeOpenApi(listEndpoints(modules), { t: context.locals.t, server: config().appUrl });
  },
);
