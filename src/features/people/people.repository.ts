import type { Knex } from 'knex';
import { z } from 'zod';
import { likePattern } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { ListPeople } from './people.schema.ts';
import type { Person } from './person.ts';
import { completePeople } from './person-row.repository.ts';

const sortColumns = {
  name: 'name_search',
  added: 'id',
  consent: 'consent',
  language: 'language',
} as const satisfies Record<ListPeople['sort'], string>;

const placeSchema = z.tuple([z.string(), z.string()]);

/** Where a page ended, as a word for an address. */
function writePlace(value: string, id: string): string {
  return Buffer.from(JSON.stringify([value, id])).toString('base64url');
}

/** @returns null for a place that no page has named: the list then begins at its start */
function readPlace(text: string | undefined): [value: string, id: string] | null {
  if (text === undefined) return null;
  try {
    return placeSchema.parse(JSON.parse(Buffer.from(text, 'base64url').toString()));
  } catch {
    return null;
  }
}

function onlyOperators(query: Knex.QueryBuilder, { db }: ShopScope): void {
  const held = () =>
    db('person_roles')
      .where('person_roles.shop_id', db.ref('people.shop_id'))
      .where('person_roles.person_id', db.ref('people.id'))
      .select('person_roles.id');
  query.whereExists(held().where({ role: 'operator' })).whereNotExists(held().whereNot({ role: 'operator' }));
}

function showOnly(query: Knex.QueryBuilder, show: ListPeople['show']): void {
  query.where({ active: show !== 'not active' });
  if (show === 'not asked') query.whereIn('consent', ['unasked', 'asked']).whereNotNull('phone');
}

function startAfter(query: Knex.QueryBuilder, list: Pick<ListPeople, 'sort' | 'direction' | 'after'>): void {
  const place = readPlace(list.after);
  if (!place) return;
  const [value, id] = place;
  const column = sortColumns[list.sort];
  const beyond = list.direction === 'ascending' ? '>' : '<';
  query.where((rest) =>
    rest.where(column, beyond, value).orWhere((tied) => tied.where(column, value).where('id', beyond, id)),
  );
}

export interface PeoplePage {
  people: Person[];
  /** Goes on after this page; null on the last one. */
  next: string | null;
}

/** One page of the shop's people, found, sorted and cut by the database. */
export async function listPeoplePage(
  scope: ShopScope,
  list: ListPeople & { operatorsOnly: boolean },
): Promise<PeoplePage> {
  const column = sortColumns[list.sort];
  const order = list.direction === 'ascending' ? 'asc' : 'desc';
  const query = scope.db('people').where({ shop_id: scope.shopId });
  if (list.operatorsOnly) onlyOperators(query, scope);
  if (list.search !== '') query.whereRaw("name_search like ? escape '\\'", [likePattern(list.search)]);
  showOnly(query, list.show);
  startAfter(query, list);
  const rows: Record<string, unknown>[] = await query
    .orderBy([
      { column, order },
      { column: 'id', order },
    ])
    .limit(list.limit + 1);
  const shown = rows.slice(0, list.limit);
  const last = shown.at(-1);
  const goesOn = rows.length > list.limit && last !== undefined;
  return {
    people: await completePeople(scope, shown),
    next: goesOn ? writePlace(String(last[column]), String(last['id'])) : null,
  };
}

/** Whether the shop has nobody in it who fits, whatever is searched for: the page then says what to do first. */
export async function countPeople(scope: ShopScope, which: { operatorsOnly: boolean }): Promise<number> {
  const query = scope.db('people').where({ shop_id: scope.shopId });
  if (which.operatorsOnly) onlyOperators(query, scope);
  const [row] = await query.count({ count: '*' });
  return Number(row?.['count'] ?? 0);
}

/** The names of these people, by id. */
export async function readNames(scope: ShopScope, ids: readonly string[]): Promise<Map<string, string>> {
  const rows = z.array(z.object({ id: z.string(), name: z.string() })).parse(
    await scope
      .db('people')
      .where({ shop_id: scope.shopId })
      .whereIn('id', [...ids])
      .select('id', 'name'),
  );
  return new Map(rows.map(({ id, name }) => [id, name]));
}

/** The languages that the shop's active people read. */
export async function readCrewLanguages(scope: ShopScope): Promise<string[]> {
  const found: unknown[] = await scope
    .db('people')
    .where({ shop_id: scope.shopId, active: true })
    .distinct()
    .pluck('language');
  return found.map(String);
}
