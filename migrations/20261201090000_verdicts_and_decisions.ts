import type { Knex } from 'knex';
import { allowChanges, refuseChanges, sameShop, shopRow } from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('verdicts', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    table.integer('n').notNullable();
    table.text('input_hash').notNullable();
    table.text('core_version').notNullable();
    table.text('analysis').notNullable();
    table.text('facts').notNullable();
    table.bigInteger('created_at').notNullable();
    table.unique(['shop_id', 'trial_id', 'n']);
    table.unique(['shop_id', 'trial_id', 'input_hash', 'core_version']);
  });
  // What was shown is what is stored.
  await refuseChanges(knex, 'verdicts');

  await knex.schema.createTable('decisions', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    table.integer('n').notNullable();
    sameShop(table, 'verdict_id', 'verdicts');
    table.text('outcome').notNullable();
    table.text('settings').notNullable();
    table.text('note').notNullable();
    sameShop(table, 'decided_by', 'people');
    table.bigInteger('decided_at').notNullable();
    table.unique(['shop_id', 'trial_id', 'n']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await allowChanges(knex, 'verdicts');
  for (const table of ['decisions', 'verdicts']) await knex.schema.dropTable(table);
}
