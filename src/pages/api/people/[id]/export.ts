import { z } from 'zod';
import { peopleReaderOf } from '../../../../features/people/people-reader.service.ts';
import { personParamsSchema } from '../../../../features/people/person.schema.ts';
import { exportPerson } from '../../../../features/people/person-export.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** A file with all that is held about a person. */
export const GET = defineEndpoint(
  { access: 'erase', params: personParamsSchema, output: z.unknown() },
  async ({ scope, viewer, params }) => {
    const held = await exportPerson(scope, params.id, peopleReaderOf(viewer));
    return new Response(JSON.stringify(held, null, 2), {
      headers: {
        'Content-Type': 'application/json',
        'Content-Disposition': 'attachment; filename="person.json"',
        'Cache-Control': 'no-store',
      },
    });
  },
);
