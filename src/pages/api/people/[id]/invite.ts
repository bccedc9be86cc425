import { z } from 'zod';
import { invitePerson } from '../../../../features/people/invite-person.service.ts';
import { peopleReaderOf } from '../../../../features/people/people-reader.service.ts';
import { personParamsSchema } from '../../../../features/people/person.schema.ts';
import { publicPersonSchema, toPublicPerson } from '../../../../features/people/public-person.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const POST = defineEndpoint(
  {
    access: 'operator.invite',
    params: personParamsSchema,
    body: z.strictObject({}),
    output: z.object({ person: publicPersonSchema, ways: z.array(z.enum(['mail', 'text'])) }),
  },
  async ({ scope, viewer, params }) => {
    const reader = peopleReaderOf(viewer);
    const { person, ways } = await invitePerson(scope, params.id, reader);
    return { person: toPublicPerson(person, reader), ways };
  },
);
