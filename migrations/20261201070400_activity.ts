import type { Knex } from 'knex';
import { allowChanges, refuseChanges, shopRow } from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('activity', (table) => {
    shopRow(table);
    table.bigInteger('seq').notNullable();
    table.bigInteger('at').notNullable();
    table.text('actor_kind').notNullable();
    table.text('actor_id');
    table.text('kind').notNullable();
    table.text('subject_id');
    table.text('trial_id');
    table.text('details').notNullable();
    table.text('prev_hash').notNullable();
    table.text('hash').notNullable();
    table.unique(['shop_id', 'seq']);
    table.index(['shop_id', 'subject_id', 'seq']);
    table.index(['shop_id', 'trial_id', 'seq']);
  });
  await refuseChanges(knex, 'activity');
}

export async function down(knex: Knex): Promise<void> {
  await allowChanges(knex, 'activity');
  await knex.schema.dropTable('activity');
}
