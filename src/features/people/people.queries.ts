import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import { callServer } from '../../components/island/call-server.ts';
import { type ImportPreview, importPreviewSchema } from './import.schema.ts';
import type { AddPerson, ChangePerson } from './person.schema.ts';
import { type PersonPage, personPageSchema } from './person-page.schema.ts';
import { type PublicPerson, publicPersonSchema } from './public-person.ts';

function pathOf(id: string, action = ''): string {
  return `/api/people/${id}${action}`;
}

/** A person with the history of consent; the page brings the first answer along. */
export function personOptions(first: PersonPage) {
  return queryOptions({
    queryKey: ['person', first.person.id],
    queryFn: () => callServer(pathOf(first.person.id), { output: personPageSchema }),
    initialData: first,
    staleTime: Number.POSITIVE_INFINITY,
  });
}

export function addPersonCall(body: AddPerson): Promise<PublicPerson> {
  return callServer('/api/people', { method: 'POST', body, output: publicPersonSchema });
}

export function changePersonCall(id: string, body: ChangePerson): Promise<PublicPerson> {
  return callServer(pathOf(id), { method: 'PATCH', body, output: publicPersonSchema });
}

export function movePersonCall(
  person: Pick<PublicPerson, 'id' | 'revision'>,
  action: 'deactivate' | 'activate' | 'erase',
): Promise<PublicPerson> {
  const body = { revision: person.revision };
  return callServer(pathOf(person.id, `/${action}`), { method: 'POST', body, output: publicPersonSchema });
}

const invitedSchema = z.object({ person: publicPersonSchema, ways: z.array(z.enum(['mail', 'text'])) });

export function invitePersonCall(id: string): Promise<z.output<typeof invitedSchema>> {
  return callServer(pathOf(id, '/invite'), { method: 'POST', body: {}, output: invitedSchema });
}

/** Looks at a file, or (with the digest of what was looked at) brings it in. */
export function importPeopleCall(file: Blob, digest: string | null): Promise<ImportPreview> {
  const query = digest === null ? 'preview=1' : `digest=${digest}`;
  const body = new Blob([file], { type: 'text/csv' });
  return callServer(`/api/people/import?${query}`, { method: 'POST', body, output: importPreviewSchema });
}
