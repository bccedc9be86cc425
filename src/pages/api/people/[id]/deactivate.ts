import { peopleReaderOf } from '../../../../features/people/people-reader.service.ts';
import { personParamsSchema, personRevisionSchema } from '../../../../features/people/person.schema.ts';
import { deactivatePerson } from '../../../../features/people/person.service.ts';
import { publicPersonSchema, toPublicPerson } from '../../../../features/people/public-person.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const POST = defineEndpoint(
  {
    access: 'people.manage',
    params: personParamsSchema,
    body: personRevisionSchema,
    output: publicPersonSchema,
  },
  async ({ scope, viewer, params, body }) => {
    const reader = peopleReaderOf(viewer);
    return toPublicPerson(await deactivatePerson(scope, { ...params, ...body }, reader), reader);
  },
);
