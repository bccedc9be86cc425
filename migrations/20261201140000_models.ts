import type { Knex } from 'knex';
import { sameShop, shopRow } from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('models', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    table.text('name').notNullable();
    table.text('spec').notNullable();
    table.text('input_hash').notNullable();
    sameShop(table, 'made_by', 'people');
    table.bigInteger('created_at').notNullable();
    table.bigInteger('updated_at').notNullable();
    table.unique(['shop_id', 'trial_id', 'name']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('models');
}
