import { erasePerson } from '../../../../features/people/erase.service.ts';
import { peopleReaderOf } from '../../../../features/people/people-reader.service.ts';
import { personParamsSchema, personRevisionSchema } from '../../../../features/people/person.schema.ts';
import { publicPersonSchema, toPublicPerson } from '../../../../features/people/public-person.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const POST = defineEndpoint(
  {
    access: 'erase',
    params: personParamsSchema,
    body: personRevisionSchema,
    output: publicPersonSchema,
  },
  async ({ scope, viewer, params, body }) => {
    const reader = peopleReaderOf(viewer);
    return toPublicPerson(await erasePerson(scope, { ...params, ...body }, reader), reader);
  },
);
