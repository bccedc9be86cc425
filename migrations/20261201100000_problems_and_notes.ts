import type { Knex } from 'knex';
import { sameShop, shopRow } from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('problems', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    sameShop(table, 'run_id', 'runs', 'optional');
    table.text('words').notNullable();
    sameShop(table, 'raised_by', 'people', 'optional');
    table.bigInteger('raised_at').notNullable();
    sameShop(table, 'settled_by', 'people', 'optional');
    table.bigInteger('settled_at');
    table.index(['shop_id', 'trial_id', 'settled_at']);
  });

  await knex.schema.createTable('notes', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    sameShop(table, 'run_id', 'runs', 'optional');
    table.text('words').notNullable();
    sameShop(table, 'written_by', 'people', 'optional');
    table.bigInteger('created_at').notNullable();
    table.index(['shop_id', 'trial_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['notes', 'problems']) await knex.schema.dropTable(table);
}
