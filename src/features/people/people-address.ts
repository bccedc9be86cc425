import { type ListPeople, listPeopleSchema } from './people.schema.ts';

const usual = listPeopleSchema.parse({});

/** What an address of the list asks for; what cannot be read in it is left at its usual value. */
export function readPeopleList(query: URLSearchParams): ListPeople {
  const read: Record<string, unknown> = {};
  for (const field of Object.keys(listPeopleSchema.shape) as (keyof ListPeople)[]) {
    const parsed = listPeopleSchema.shape[field].safeParse(query.get(field) ?? undefined);
    if (parsed.success) read[field] = parsed.data;
  }
  return listPeopleSchema.parse(read);
}

/** The address of a list, from its start or after a place. Usual values are left out. */
export function peopleAddress(list: ListPeople, after?: string): string {
  const query = new URLSearchParams();
  for (const field of ['search', 'show', 'sort', 'direction'] as const) {
    if (list[field] !== usual[field]) query.set(field, list[field]);
  }
  if (after !== undefined) query.set('after', after);
  const text = query.toString();
  return text === '' ? '/people' : `/people?${text}`;
}

/** The list sorted by a column; by the same column again, turned round. */
export function sortedAddress(list: ListPeople, sort: ListPeople['sort']): string {
  const turns = list.sort === sort && list.direction === 'ascending';
  return peopleAddress({ ...list, sort, direction: turns ? 'descending' : 'ascending' });
}
