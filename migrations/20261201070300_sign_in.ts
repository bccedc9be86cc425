import type { Knex } from 'knex';
import { sameShop, shopRow } from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('sessions', (table) => {
    shopRow(table);
    table.text('id_hash').notNullable().unique();
    table.text('handle').notNullable().unique();
    sameShop(table, 'person_id', 'people');
    table.bigInteger('expires_at').notNullable().index();
    table.bigInteger('last_seen_at').notNullable();
    table.text('device').notNullable();
    table.bigInteger('created_at').notNullable();
    table.index(['shop_id', 'person_id']);
  });

  await knex.schema.createTable('links', (table) => {
    shopRow(table);
    table.text('token_hash').notNullable().unique();
    table.text('purpose').notNullable();
    sameShop(table, 'person_id', 'people', 'optional');
    sameShop(table, 'trial_id', 'trials', 'optional');
    table.bigInteger('expires_at').notNullable().index();
    table.bigInteger('used_at');
    table.bigInteger('revoked_at');
    table.bigInteger('created_at').notNullable();
    table.index(['shop_id', 'person_id', 'purpose']);
  });

  await knex.schema.createTable('api_tokens', (table) => {
    shopRow(table);
    table.text('token_hash').notNullable().unique();
    table.text('prefix').notNullable();
    table.text('name').notNullable();
    sameShop(table, 'person_id', 'people');
    table.bigInteger('expires_at').notNullable();
    table.bigInteger('last_used_at');
    table.bigInteger('revoked_at');
    table.bigInteger('created_at').notNullable();
    table.index(['shop_id', 'person_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['api_tokens', 'links', 'sessions']) await knex.schema.dropTable(table);
}
