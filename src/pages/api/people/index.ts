import { z } from 'zod';
import { listPeopleSchema } from '../../../features/people/people.schema.ts';
import { listPeople } from '../../../features/people/people.service.ts';
import { peopleReaderOf } from '../../../features/people/people-reader.service.ts';
import { addPersonSchema } from '../../../features/people/person.schema.ts';
import { addPerson } from '../../../features/people/person.service.ts';
import { publicPersonSchema, toPublicPerson } from '../../../features/people/public-person.ts';
import { defineEndpoint } from '../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  {
    access: 'operator.invite',
    query: listPeopleSchema,
    output: z.object({ people: z.array(publicPersonSchema), next: z.string().nullable() }),
  },
  async ({ scope, viewer, query }) => {
    const reader = peopleReaderOf(viewer);
    const { people, next } = await listPeople(scope, query, reader);
    return { people: people.map((person) => toPublicPerson(person, reader)), next };
  },
);

export const POST = defineEndpoint(
  { access: 'operator.invite', body: addPersonSchema, output: publicPersonSchema, status: 201 },
  async ({ scope, viewer, body }) => {
    const reader = peopleReaderOf(viewer);
    return toPublicPerson(await addPerson(scope, body, reader), reader);
  },
);
