import { changePerson } from '../../../../features/people/change-person.service.ts';
import { peopleReaderOf } from '../../../../features/people/people-reader.service.ts';
import { changePersonSchema, personParamsSchema } from '../../../../features/people/person.schema.ts';
import { personPageSchema } from '../../../../features/people/person-page.schema.ts';
import { readPersonPage } from '../../../../features/people/person-page.service.ts';
import { publicPersonSchema, toPublicPerson } from '../../../../features/people/public-person.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'operator.invite', params: personParamsSchema, output: personPageSchema },
  ({ scope, viewer, params }) => readPersonPage(scope, params.id, peopleReaderOf(viewer)),
);

export const PATCH = defineEndpoint(
  {
    access: 'operator.invite',
    params: personParamsSchema,
    body: changePersonSchema,
    output: publicPersonSchema,
  },
  async ({ scope, viewer, params, body }) => {
    const reader = peopleReaderOf(viewer);
    return toPublicPerson(await changePerson(scope, { id: params.id, input: body }, reader), reader);
  },
);
