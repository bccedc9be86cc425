import type { Knex } from 'knex';
import { sameShop, shopRow } from '../src/server/db/schema-parts.ts';

const textColumns = ['photo_state', 'photo_attempts', 'photo_not_before'];

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('photos', (table) => {
    shopRow(table);
    sameShop(table, 'run_id', 'runs');
    table.text('sha256').notNullable();
    table.integer('width').notNullable();
    table.integer('height').notNullable();
    table.binary('bytes').notNullable();
    table.text('source').notNullable();
    table.text('sent_by');
    table.foreign(['shop_id', 'sent_by']).references(['shop_id', 'id']).inTable('people');
    table.bigInteger('created_at').notNullable();
    // The same picture sent twice is one picture.
    table.unique(['shop_id', 'run_id', 'sha256']);
  });
  // Pictures of a text are fetched after it was read, when it is known which run they belong to.
  await knex.schema.alterTable('inbox_texts', (table) => {
    table.text('photo_state').notNullable().defaultTo('none');
    table.integer('photo_attempts').notNullable().defaultTo(0);
    table.bigInteger('photo_not_before').notNullable().defaultTo(0);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const column of textColumns) await knex.raw('alter table ?? drop column ??', ['inbox_texts', column]);
  await knex.schema.dropTable('photos');
}
