import type { Knex } from 'knex';
import { z } from 'zod';
import { likePattern } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { readTrialRows } from './trial.repository.ts';
import { type ListTrials, statesOfFilter } from './trial.schema.ts';
import type { Trial } from './trial.ts';

const sortColumns = {
  changed: 'updated_at',
  number: 'number',
  title: 'title_search',
  machine: 'machine_search',
} as const satisfies Record<ListTrials['sort'], string>;

const placeSchema = z.tuple([z.union([z.string(), z.number()]), z.string()]);
type Place = z.output<typeof placeSchema>;

function writePlace(place: Place): string {
  return Buffer.from(JSON.stringify(place)).toString('base64url');
}

/** @returns null for a place that no page has named: the list then begins at its start */
function readPlace(text: string | undefined): Place | null {
  if (text === undefined) return null;
  try {
    return placeSchema.parse(JSON.parse(Buffer.from(text, 'base64url').toString()));
  } catch {
    return null;
  }
}

function narrow(query: Knex.QueryBuilder, list: ListTrials): void {
  if (list.show === 'away') query.whereNotNull('put_away_at');
  else query.whereNull('put_away_at');
  if (list.state !== 'all') query.whereIn('state', [...statesOfFilter[list.state]]);
  if (list.search === '') return;
  const pattern = likePattern(list.search);
  query.whereRaw("(title_search like ? escape '\\' or machine_search like ? escape '\\')", [
    pattern,
    pattern,
  ]);
}

function startAfter(query: Knex.QueryBuilder, list: ListTrials): void {
  const place = readPlace(list.after);
  if (!place) return;
  const [value, id] = place;
  const column = sortColumns[list.sort];
  const beyond = list.direction === 'ascending' ? '>' : '<';
  query.where((rest) =>
    rest.where(column, beyond, value).orWhere((tied) => tied.where(column, value).where('id', beyond, id)),
  );
}

/** One page of the shop's trials, found, sorted and cut by the database. `next` goes on after it; null on the last. */
export async function listTrialsPage(
  scope: ShopScope,
  list: ListTrials,
): Promise<{ trials: Trial[]; next: string | null }> {
  const column = sortColumns[list.sort];
  const order = list.direction === 'ascending' ? 'asc' : 'desc';
  const query = scope.db('trials').where({ shop_id: scope.shopId });
  narrow(query, list);
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
  const place = goesOn ? placeSchema.parse([last[column], last['id']]) : null;
  return { trials: readTrialRows(shown), next: place ? writePlace(place) : null };
}

/** How many trials the shop has at all, whatever is searched for: the page then says what to do first. */
export async function countTrials(scope: ShopScope): Promise<number> {
  const [row] = await scope.db('trials').where({ shop_id: scope.shopId }).count({ count: '*' });
  return Number(row?.['count'] ?? 0);
}

/** How many trials somebody has begun. */
export async function countTrialsOf(scope: ShopScope, ownerId: string): Promise<number> {
  const [row] = await scope
    .db('trials')
    .where({ shop_id: scope.shopId, owner_id: ownerId })
    .count({ count: '*' });
  return Number(row?.['count'] ?? 0);
}
