import { type ListTrials, listTrialsSchema } from './trial.schema.ts';

const usual = listTrialsSchema.parse({});

/** The way round that is most asked for: the newest first, names from A. */
const firstDirection = {
  changed: 'descending',
  number: 'descending',
  title: 'ascending',
  machine: 'ascending',
} as const satisfies Record<ListTrials['sort'], ListTrials['direction']>;

/** What an address of the list asks for; what cannot be read in it is left at its usual value. */
export function readTrialsList(query: URLSearchParams): ListTrials {
  const read: Record<string, unknown> = {};
  for (const field of Object.keys(listTrialsSchema.shape) as (keyof ListTrials)[]) {
    const parsed = listTrialsSchema.shape[field].safeParse(query.get(field) ?? undefined);
    if (parsed.success) read[field] = parsed.data;
  }
  return listTrialsSchema.parse(read);
}

/** The address of a list, from its start or after a place. Usual values are left out. */
export function trialsAddress(list: ListTrials, after?: string): string {
  const query = new URLSearchParams();
  for (const field of ['search', 'state', 'show', 'sort', 'direction'] as const) {
    if (list[field] !== usual[field]) query.set(field, list[field]);
  }
  if (after !== undefined) query.set('after', after);
  const text = query.toString();
  return text === '' ? '/trials' : `/trials?${text}`;
}

/** The list sorted by a column; by the same column again, turned round. */
export function sortedTrialsAddress(list: ListTrials, sort: ListTrials['sort']): string {
  const turned = list.direction === 'ascending' ? 'descending' : 'ascending';
  return trialsAddress({ ...list, sort, direction: list.sort === sort ? turned : firstDirection[sort] });
}
