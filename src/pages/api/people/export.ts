import { z } from 'zod';
import { exportPeople } from '../../../features/people/people-file.service.ts';
import { defineEndpoint } from '../../../server/http/define-endpoint.ts';

/** Everybody who is active, as a file that the import reads back. */
export const GET = defineEndpoint({ access: 'people.manage', output: z.unknown() }, async ({ scope }) => {
  return new Response(await exportPeople(scope), {
    headers: {
      'Content-Type': 'text/csv; charset=utf-8',
      'Content-Disposition': 'attachment; filename="people.csv"',
      'Cache-Control': 'no-store',
    },
  });
});
