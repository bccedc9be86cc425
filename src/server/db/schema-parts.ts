import type { Knex } from 'knex';

/** `id`, `shop_id` and the pair of both, so that children can point at it without ever leaving the shop. */
export function shopRow(table: Knex.CreateTableBuilder): void {
  table.text('id').primary();
  table.text('shop_id').notNullable().references('id').inTable('shops');
  table.unique(['shop_id', 'id']);
}

/** A reference to a row of the same shop: `(shop_id, column)` to `(shop_id, id)` of the parent. */
export function sameShop(
  table: Knex.CreateTableBuilder,
  column: string,
  parent: string,
  presence: 'required' | 'optional' = 'required',
): void {
  const made = table.text(column);
  if (presence === 'required') made.notNullable();
  table.foreign(['shop_id', column]).references(['shop_id', 'id']).inTable(parent);
}

/** A unique index over the rows that meet a condition (portable SQL). */
export async function uniqueWhere(
  knex: Knex,
  index: { name: string; table: string; columns: string[]; where: string },
): Promise<void> {
  const columns = index.columns.map((column) => `"${column}"`).join(', ');
  await knex.raw(`create unique index "${index.name}" on "${index.table}" (${columns}) where ${index.where}`);
}

/**
 * The only place where the two databases differ: triggers that refuse to change or delete rows of a table.
 * @param onceSet a column: only rows in which it is set are refused
 */
export async function refuseChanges(knex: Knex, table: string, onceSet?: string): Promise<void> {
  const when = onceSet === undefined ? '' : `when (old.${onceSet} is not null)`;
  if (knex.client.config.client === 'pg') {
    await knex.raw(
      `create function ${table}_refuse() returns trigger as $$ begin raise exception '${table} only grows'; end $$ language plpgsql`,
    );
    await knex.raw(
      `create trigger ${table}_only_grows before update or delete on ${table} for each row ${when} execute function ${table}_refuse()`,
    );
    return;
  }
  for (const change of ['update', 'delete']) {
    await knex.raw(
      `create trigger ${table}_no_${change} before ${change} on ${table} ${when} begin select raise(abort, '${table} only grows'); end`,
    );
  }
}

/** Takes the triggers of `refuseChanges` away again: for a migration's `down` and for the removal of a whole shop. */
export async function allowChanges(knex: Knex, table: string): Promise<void> {
  if (knex.client.config.client === 'pg') {
    await knex.raw(`drop trigger if exists ${table}_only_grows on ${table}`);
    await knex.raw(`drop function if exists ${table}_refuse()`);
    return;
  }
  for (const change of ['update', 'delete']) await knex.raw(`drop trigger if exists ${table}_no_${change}`);
}
